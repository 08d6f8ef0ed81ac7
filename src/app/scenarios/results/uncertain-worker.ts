/// <reference lib="webworker" />
import { uncertainPlan } from '@prediction';
import type { UncertainQuestion } from './uncertain-request';

addEventListener('message', ({ data: { basis, request } }: MessageEvent<UncertainQuestion>) => {
  postMessage(uncertainPlan(basis, request));
});

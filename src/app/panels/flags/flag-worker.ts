/// <reference lib="webworker" />
import { type PanelQuestion, foundInPanel } from './found-in-panel';

addEventListener('message', ({ data }: MessageEvent<PanelQuestion>) => {
  postMessage(foundInPanel(data));
});

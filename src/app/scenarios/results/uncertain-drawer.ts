import { Injectable, type OnDestroy } from '@angular/core';
import type { UncertainYear } from '@prediction';
import { Observable } from 'rxjs';
import type { UncertainAnswer, UncertainQuestion } from './uncertain-request';

/** Draws uncertain plans beside the page, so that no slider waits for it. One question at a time. */
@Injectable()
export class UncertainDrawer implements OnDestroy {
  #worker: Worker | null = null;

  /** Whoever stops listening gives the question up; the worker goes on to the next. */
  draw(question: UncertainQuestion): Observable<UncertainAnswer> {
    return new Observable((listener) => {
      let isAnswered = false;
      const worker = (this.#worker ??= new Worker(new URL('./uncertain-worker', import.meta.url), {
        type: 'module',
      }));
      worker.onmessage = ({ data }: MessageEvent<readonly UncertainYear[]>) => {
        isAnswered = true;
        listener.next({ question, years: data });
        listener.complete();
      };
      worker.onerror = (event) => {
        listener.next({ question, years: [], failure: event.message });
        listener.complete();
      };
      worker.postMessage(question);
      // An answer to a question given up must not be taken for the next one's.
      return () => {
        if (!isAnswered) this.#stop();
      };
    });
  }

  ngOnDestroy(): void {
    this.#stop();
  }

  #stop(): void {
    this.#worker?.terminate();
    this.#worker = null;
  }
}

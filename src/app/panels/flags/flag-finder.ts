import { Observable, defer, of } from 'rxjs';
import { type FoundInPanel, type PanelQuestion, foundInPanel } from './found-in-panel';

/** A panel of so many rows is looked through within some frames; a larger one would hold the page. */
const mostRowsHere = 2000;

/** Looks through a panel's cells, a large panel beside the page. Whoever stops listening stops the work. */
export function findInPanel(question: PanelQuestion): Observable<FoundInPanel> {
  return question.cells.year.length > mostRowsHere
    ? besideThePage(question)
    : defer(() => of(foundInPanel(question)));
}

function besideThePage(question: PanelQuestion): Observable<FoundInPanel> {
  return new Observable((listener) => {
    const worker = new Worker(new URL('./flag-worker', import.meta.url), { type: 'module' });
    worker.onmessage = ({ data }: MessageEvent<FoundInPanel>) => {
      listener.next(data);
      listener.complete();
    };
    worker.onerror = (event) => {
      listener.error(new Error(`expected the panel to be looked through; found: ${event.message}`));
    };
    worker.postMessage(question);
    return () => {
      worker.terminate();
    };
  });
}

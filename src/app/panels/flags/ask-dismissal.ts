import { Injectable, Injector, inject } from '@angular/core';
import type { DismissQuestion } from './dismiss-dialog';

/** Asks why flagged figures are right; the dialog loads on first use. */
@Injectable({ providedIn: 'root' })
export class AskDismissal {
  readonly #injector = inject(Injector);

  async ask(question: DismissQuestion): Promise<void> {
    const [{ MatDialog, MatDialogConfig }, { DismissDialog }] = await Promise.all([
      import('@angular/material/dialog'),
      import('./dismiss-dialog'),
    ]);
    const config = Object.assign(new MatDialogConfig<DismissQuestion>(), {
      data: question,
      width: '560px',
      maxWidth: '96vw',
    });
    this.#injector.get(MatDialog).open(DismissDialog, config);
  }
}

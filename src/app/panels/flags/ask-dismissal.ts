import { Injectable, Injector, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { DismissQuestion } from './dismiss-dialog';

/** Asks why flagged figures are right; the dialog loads on first use. */
@Injectable({ providedIn: 'root' })
export class AskDismissal {
  readonly #injector = inject(Injector);

  /** @returns how many flags were put aside; 0 where the flag is kept. */
  async ask(question: DismissQuestion): Promise<number> {
    const [{ MatDialog, MatDialogConfig }, { DismissDialog }] = await Promise.all([
      import('@angular/material/dialog'),
      import('./dismiss-dialog'),
    ]);
    const config = Object.assign(new MatDialogConfig<DismissQuestion>(), {
      data: question,
      width: '560px',
      maxWidth: '96vw',
    });
    const opened = this.#injector
      .get(MatDialog)
      .open<unknown, DismissQuestion, number>(DismissDialog, config);
    return (await firstValueFrom(opened.afterClosed(), { defaultValue: 0 })) ?? 0;
  }
}

import { Injectable, Injector, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { ReasonAnswer, ReasonQuestion } from './reason-dialog';

/** Asks for one reason for several companies. */
@Injectable({ providedIn: 'root' })
export class AskReason {
  readonly #injector = inject(Injector);

  /** Null for Esc, a click beside, or `Keep it as it is`. The dialog loads on first use. */
  async ask(question: ReasonQuestion): Promise<ReasonAnswer | null> {
    const [{ MatDialog, MatDialogConfig }, { ReasonDialog }] = await Promise.all([
      import('@angular/material/dialog'),
      import('./reason-dialog'),
    ]);
    const config = Object.assign(new MatDialogConfig<ReasonQuestion>(), {
      data: question,
      maxWidth: 560,
    });
    const opened = this.#injector
      .get(MatDialog)
      .open<unknown, ReasonQuestion, ReasonAnswer | null>(ReasonDialog, config);
    return (await firstValueFrom(opened.afterClosed(), { defaultValue: null })) ?? null;
  }
}

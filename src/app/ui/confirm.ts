import { Injectable, Injector, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { ConfirmQuestion } from './confirm-question';

/** Asks before what cannot be undone. What can be undone is not asked about: it gets `UndoNotice`. */
@Injectable({ providedIn: 'root' })
export class Confirm {
  readonly #injector = inject(Injector);

  /** True when the person agrees; false for Esc, a click beside, or `Keep it as it is`. The dialog loads on first use. */
  async ask(question: ConfirmQuestion): Promise<boolean> {
    const [{ MatDialog, MatDialogConfig }, { ConfirmDialog }] = await Promise.all([
      import('@angular/material/dialog'),
      import('./confirm-dialog'),
    ]);
    const config = Object.assign(new MatDialogConfig<ConfirmQuestion>(), {
      data: question,
      maxWidth: 480,
    });
    const opened = this.#injector
      .get(MatDialog)
      .open<unknown, ConfirmQuestion, boolean>(ConfirmDialog, config);
    return (await firstValueFrom(opened.afterClosed(), { defaultValue: false })) ?? false;
  }
}

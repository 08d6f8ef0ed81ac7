import { Injectable, Injector, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';

export interface ConfirmQuestion {
  readonly title: string;
  /** What will happen, and whether it can be taken back. */
  readonly detail: string;
  /** The verb on the button: `Remove member`. */
  readonly action: string;
  /** A word the person has to type first, where nothing can be taken back. */
  readonly typed?: string;
}

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

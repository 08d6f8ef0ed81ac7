import { Injectable, Injector, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { RestoreDialog, RestoreQuestion } from './restore-dialog';

/** Puts an older version back where the person agrees and says why; the dialog loads on first use. */
@Injectable({ providedIn: 'root' })
export class AskRestore {
  readonly #injector = inject(Injector);

  /** @returns the id of the version that was made; undefined where none was. */
  async ask(question: RestoreQuestion): Promise<string | undefined> {
    const [{ MatDialog, MatDialogConfig }, dialog] = await Promise.all([
      import('@angular/material/dialog'),
      import('./restore-dialog'),
    ]);
    const config = Object.assign(new MatDialogConfig<RestoreQuestion>(), {
      data: question,
      maxWidth: 520,
    });
    const opened = this.#injector
      .get(MatDialog)
      .open<RestoreDialog, RestoreQuestion, string>(dialog.RestoreDialog, config);
    return firstValueFrom(opened.afterClosed(), { defaultValue: undefined });
  }
}

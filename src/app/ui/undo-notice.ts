import { Injectable, Injector, inject } from '@angular/core';

const shownMs = 10_000;

/** Says what was done and offers to take it back, for ten seconds. Never for errors. */
@Injectable({ providedIn: 'root' })
export class UndoNotice {
  readonly #injector = inject(Injector);

  /** `undo` runs when the person selects Undo; its own failure is for the caller's store to show. */
  async show(message: string, undo: () => void): Promise<void> {
    const { MatSnackBar, MatSnackBarConfig } = await import('@angular/material/snack-bar');
    const config = Object.assign(new MatSnackBarConfig(), { duration: shownMs });
    const shown = this.#injector.get(MatSnackBar).open(message, 'Undo', config);
    shown.onAction().subscribe(undo);
  }
}

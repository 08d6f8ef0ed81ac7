import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import type { ShownProblem } from '../ui/problem';
import { ProblemNotice } from '../ui/problem-notice';

export interface ConfirmDialogData {
  readonly title: string;
  /** What happens, and what does not. */
  readonly consequence: string;
  /** The button's verb. */
  readonly action: string;
  /** @returns the problem that kept it from being done, or null. */
  readonly run: () => Promise<ShownProblem | null>;
}

/** Asks before something that cannot be taken back; stays open and says so when it cannot be done. */
@Component({
  selector: 'kv-confirm-dialog',
  imports: [MatButtonModule, MatDialogModule, ProblemNotice],
  template: `
    <h2 mat-dialog-title>{{ data.title }}</h2>
    <mat-dialog-content>
      <p>{{ data.consequence }}</p>
      @if (problem(); as found) {
        <kv-problem-notice [problem]="found" />
      }
    </mat-dialog-content>
    <mat-dialog-actions>
      <button mat-button type="button" mat-dialog-close>Cancel</button>
      <button mat-flat-button type="button" [disabled]="isRunning()" (click)="run()">
        {{ data.action }}
      </button>
    </mat-dialog-actions>
  `,
  styles: `
    :host {
      --mat-dialog-supporting-text-color: var(--kv-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmDialog {
  readonly #dialog = inject<MatDialogRef<ConfirmDialog>>(MatDialogRef);
  protected readonly data = inject<ConfirmDialogData>(MAT_DIALOG_DATA);

  protected readonly isRunning = signal(false);
  protected readonly problem = signal<ShownProblem | null>(null);

  protected async run(): Promise<void> {
    this.isRunning.set(true);
    const problem = await this.data.run();
    this.isRunning.set(false);
    this.problem.set(problem);
    if (problem === null) this.#dialog.close();
  }
}

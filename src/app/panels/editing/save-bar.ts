import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Mark } from '../../ui/mark';

/** How much is changed and not saved, and what can be done with it. */
@Component({
  selector: 'kv-save-bar',
  imports: [Mark, MatButton],
  template: `
    <p role="status">
      <kv-mark kind="caution" /> {{ words() }} changed in version {{ number() }}, not saved
    </p>
    @if (isOvertaken()) {
      <p>A newer version was saved meanwhile.</p>
      <button matButton="filled" type="button" (click)="carryWanted.emit()">
        Carry onto the newer version…
      </button>
    } @else {
      @if (obstacle()) {
        <p>{{ obstacle() }}</p>
      }
      <button
        matButton="filled"
        type="button"
        [disabled]="obstacle() !== ''"
        (click)="saveWanted.emit()"
      >
        Save as version {{ number() + 1 }}…
      </button>
    }
    <button matButton type="button" (click)="discardWanted.emit()">Discard</button>
    @if (!isKept()) {
      <p class="kv-caption">These are too many to come back after the page is loaded again.</p>
    }
  `,
  styles: `
    :host {
      position: sticky;
      inset-block-end: 0;
      z-index: 2;
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 8px 16px;
      padding: 8px 16px;
      border: 1px solid var(--kv-edge);
      border-radius: var(--kv-corner);
      background: var(--kv-raised);
    }
    p:first-child {
      flex: 1 1 auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SaveBar {
  /** `12 cells and 1 row`. */
  readonly words = input.required<string>();
  /** Of the version that is changed. */
  readonly number = input.required<number>();
  /** Whether the edits come back after the page is loaded again. */
  readonly isKept = input(true);
  /** Why they cannot be saved as they are; empty where they can. */
  readonly obstacle = input('');
  /** Whether there is a newer version; what is changed in this one cannot be saved as the next. */
  readonly isOvertaken = input(false);
  readonly saveWanted = output();
  readonly carryWanted = output();
  readonly discardWanted = output();
}

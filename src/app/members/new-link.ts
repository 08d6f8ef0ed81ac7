import { Clipboard } from '@angular/cdk/clipboard';
import { DatePipe, DOCUMENT } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  afterNextRender,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import type { NewLink } from './members-store';

/** The link that was just made: to be copied now, since it is kept nowhere. */
@Component({
  selector: 'kv-new-link',
  imports: [DatePipe, MatButtonModule],
  template: `
    <section class="kv-sheet" aria-labelledby="new-link-title">
      <h2 #title id="new-link-title" tabindex="-1">The link for {{ link().email }}</h2>
      <label>
        <span class="kv-caption">Link</span>
        <input readonly class="kv-number" [value]="address()" (focus)="selectAll($event)" />
      </label>
      <p>
        Copy it now and hand it over: it cannot be shown again. It works once, until
        {{ link().expiresAt | date: 'd MMM y, HH:mm' }}.
      </p>
      <div class="actions">
        <button mat-flat-button type="button" (click)="copy()">Copy link</button>
        <button mat-button type="button" (click)="closed.emit()">Done</button>
        <span role="status">{{ copied() }}</span>
      </div>
    </section>
  `,
  styles: `
    section {
      display: grid;
      gap: 12px;
    }
    h2:focus {
      outline: none;
    }
    label {
      display: grid;
      gap: 4px;
    }
    input {
      inline-size: 100%;
      padding: 8px;
      border: 1px solid var(--kv-edge);
      border-radius: var(--kv-corner);
      background: var(--kv-paper);
      color: var(--kv-ink);
      font-size: 13px;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 12px;
    }
    p {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewLinkSheet {
  readonly #clipboard = inject(Clipboard);
  readonly #origin = inject(DOCUMENT).location.origin;

  readonly link = input.required<NewLink>();
  readonly closed = output();

  private readonly title = viewChild.required<ElementRef<HTMLElement>>('title');

  /** The token stands after `#`, which browsers send to no server. */
  protected readonly address = computed(() => `${this.#origin}/join#${this.link().token}`);
  protected readonly copied = signal('');

  constructor() {
    afterNextRender(() => this.title().nativeElement.focus());
  }

  protected copy(): void {
    this.copied.set(
      this.#clipboard.copy(this.address())
        ? 'Copied.'
        : 'The browser did not allow it. Select the link and copy it.',
    );
  }

  protected selectAll(event: FocusEvent): void {
    if (event.target instanceof HTMLInputElement) event.target.select();
  }
}

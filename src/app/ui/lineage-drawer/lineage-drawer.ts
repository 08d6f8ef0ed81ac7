import { DOCUMENT, DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  afterNextRender,
  afterRenderEffect,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  viewChild,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { LineageReply } from '@contract';
import { fullText, unitText } from '@figures';
import { covarianceName } from '../covariance-words';
import { lineText, rowLinkText } from '../phrases';
import type { ShownProblem } from '../problem';
import { ProblemNotice } from '../problem-notice';
import { CellOrigins } from './cell-origins';

const rowsAtFirst = 60;

/**
 * How one figure came about: its exact value, the formula in words, what went in, and the file and cells behind it.
 * Amounts stand in the panel's own unit, whatever unit the page shows. Esc closes; focus goes back to the figure.
 * The page beside it stays usable, so it is a dialog that does not block.
 */
@Component({
  selector: 'kv-lineage-drawer',
  imports: [CellOrigins, DatePipe, ProblemNotice, RouterLink],
  templateUrl: './lineage-drawer.html',
  styleUrl: './lineage-drawer.css',
  host: { '(keydown.escape)': 'closed.emit()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LineageDrawer {
  readonly #document = inject(DOCUMENT);
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef);

  /** Null while it is being read, or could not be. */
  readonly lineage = input.required<LineageReply | null>();
  readonly problem = input<ShownProblem | null>(null);
  /** Whether the person may open the panel: then each row is a link to its place there. */
  readonly mayOpenPanel = input(true);

  readonly closed = output();
  /** The key of another figure, for the inputs that have a lineage of their own. */
  readonly figureSelected = output<string>();

  private readonly title = viewChild.required<ElementRef<HTMLElement>>('title');
  #opener: HTMLElement | null = null;

  protected readonly rowLimit = linkedSignal({
    source: () => this.lineage()?.figure,
    computation: () => rowsAtFirst,
  });
  protected readonly lineText = lineText;
  protected readonly rowLinkText = rowLinkText;
  protected readonly unit = computed(() => {
    const version = this.lineage()?.panelVersion;
    return version === undefined ? '' : unitText(version.currency, version.unit);
  });
  protected readonly rows = computed(
    () => this.lineage()?.cells.rows.slice(0, this.rowLimit()) ?? [],
  );
  protected readonly hiddenRows = computed(
    () => (this.lineage()?.cells.rows.length ?? 0) - this.rows().length,
  );
  protected readonly slopes = computed(() => {
    const lineage = this.lineage();
    return lineage === null ? '' : covarianceName(lineage.fit.slopes);
  });
  protected readonly confidence = computed(() =>
    Number(((this.lineage()?.confidence ?? 0) * 100).toPrecision(6)),
  );

  constructor() {
    // The first reply may be here before the drawer, which is loaded when it is wanted.
    afterNextRender(() => {
      this.#takeFocus();
    });
    // Each further figure begins by being read: that is when focus comes here again.
    afterRenderEffect(() => {
      if (this.lineage() === null) this.#takeFocus();
    });
    inject(DestroyRef).onDestroy(() => {
      this.#giveFocusBack();
    });
  }

  protected exact(value: number | null): string {
    return fullText(value);
  }

  protected amount(value: number | null, isMoney: boolean): string {
    const text = fullText(value);
    return isMoney && value !== null ? `${text} ${this.unit()}` : text;
  }

  protected showAllRows(): void {
    this.rowLimit.set(Number.POSITIVE_INFINITY);
  }

  #takeFocus(): void {
    const active = this.#document.activeElement;
    if (active instanceof HTMLElement && !this.#host.nativeElement.contains(active))
      this.#opener = active;
    this.title().nativeElement.focus({ preventScroll: true });
  }

  #giveFocusBack(): void {
    const active = this.#document.activeElement;
    if (active === this.#document.body || this.#host.nativeElement.contains(active))
      this.#opener?.focus({ preventScroll: true });
  }
}

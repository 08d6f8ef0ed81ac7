import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
  viewChild,
} from '@angular/core';
import type { FileMending, ImportCheck, ImportFinding } from '@contract';
import { Mark } from '../../ui/mark';
import {
  type BulkAct,
  type BulkOffer,
  afterAct,
  alikeFindings,
  beforeAct,
  isStanding,
  leaveOutOffers,
  textKey,
  useForAllOffer,
} from './bulk-mending';
import { mendedText, withCell, withLine, withoutCell, withoutLine } from './mending';
import { type ReviewedRow, kindCounts, reviewOf } from './review';

const shownAtOnce = 50;

/** The rows that something was found in: each with its cells, the marked one mended in place, or the row left out. */
@Component({
  selector: 'kv-review-table',
  imports: [Mark],
  templateUrl: './review-table.html',
  styleUrls: ['./entries.css', './review-table.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewTable {
  readonly #injector = inject(Injector);
  readonly check = input.required<ImportCheck>();
  readonly headers = input.required<readonly string[]>();
  /** Headers that the panel is made of: the columns of the table. */
  readonly usedHeaders = input.required<readonly string[]>();
  readonly yearHeader = input.required<string>();
  readonly mending = input.required<FileMending>();
  readonly mendingChanged = output<FileMending>();

  protected readonly kinds = computed(() => kindCounts(this.check().findings));
  protected readonly kind = signal<ImportFinding['code'] | null>(null);
  readonly #review = computed(() =>
    reviewOf(this.check(), this.headers(), this.headers().indexOf(this.yearHeader())),
  );
  protected readonly rows = computed(() => {
    const kind = this.kind();
    const { rows } = this.#review();
    return kind === null
      ? rows
      : rows.filter(({ findings }) => findings.some(({ finding }) => finding.code === kind));
  });
  protected readonly elsewhere = computed(() => {
    const kind = this.kind();
    return this.#review().elsewhere.filter(({ code }) => kind === null || code === kind);
  });
  protected readonly limit = linkedSignal({ source: this.rows, computation: () => shownAtOnce });
  protected readonly shown = computed(() => this.rows().slice(0, this.limit()));
  protected readonly hidden = computed(() => this.rows().length - this.shown().length);
  /** Positions of the headers that are shown. */
  protected readonly columns = computed(() => {
    const headers = this.headers();
    const used = new Set(this.usedHeaders());
    const found = new Set(
      this.#review().rows.flatMap(({ findings }) => findings.map(({ column }) => column)),
    );
    return headers.flatMap((header, place) =>
      used.has(header) || found.has(place) ? [{ header, place }] : [],
    );
  });

  protected readonly offers = computed(() =>
    leaveOutOffers(this.check().findings, this.mending(), this.kind()),
  );
  readonly #alike = computed(() => alikeFindings(this.check().findings));
  readonly #lastAct = signal<BulkAct | null>(null);
  /** The last act on many at once, while anything of it stands. */
  protected readonly undoable = computed(() => {
    const act = this.#lastAct();
    return act !== null && isStanding(this.mending(), act) ? act : null;
  });
  private readonly bulk = viewChild<ElementRef<HTMLElement>>('bulk');

  protected choose(code: ImportFinding['code']): void {
    this.kind.update((kind) => (kind === code ? null : code));
  }

  protected showMore(): void {
    this.limit.update((limit) => limit + shownAtOnce);
  }

  /** How the cell is marked: by the gravest of what was found in it. */
  protected markOf({ findings }: ReviewedRow, column: number): 'error' | 'caution' | null {
    const own = findings.filter((placed) => placed.column === column);
    if (own.length === 0) return null;
    return own.some(({ finding }) => finding.isBlocking) ? 'error' : 'caution';
  }

  protected textOf(finding: ImportFinding): string {
    return mendedText(this.mending(), finding) ?? finding.found;
  }

  protected isMended(finding: ImportFinding): boolean {
    return mendedText(this.mending(), finding) !== undefined;
  }

  /** Mends of the line that nothing is found in any more. */
  protected settled({ row, findings }: ReviewedRow): FileMending['cells'] {
    return this.mending().cells.filter(
      (cell) =>
        cell.row === row.row && !findings.some(({ finding }) => finding.column === cell.column),
    );
  }

  protected isLeftOut(row: number): boolean {
    return this.mending().excludedRows.includes(row);
  }

  protected mend(finding: ImportFinding, text: string): void {
    const mending = this.mending();
    this.mendingChanged.emit(
      text === finding.found && !this.isMended(finding)
        ? mending
        : withCell(mending, finding, text.slice(0, 500)),
    );
  }

  /** Using the cell's mended text for all that read the same. */
  protected forAll(finding: ImportFinding): BulkOffer | undefined {
    const alike = this.#alike().get(textKey(finding));
    return alike && useForAllOffer(finding, alike, this.mending());
  }

  protected act(act: BulkAct): void {
    this.#lastAct.set(act);
    this.mendingChanged.emit(afterAct(this.mending(), act));
    this.#focusBulk();
  }

  protected undo(act: BulkAct): void {
    this.#lastAct.set(null);
    this.mendingChanged.emit(beforeAct(this.mending(), act));
    this.#focusBulk();
  }

  /** The button that was pressed is gone: the focus goes to what was said of it. */
  #focusBulk(): void {
    afterNextRender(() => this.bulk()?.nativeElement.focus(), { injector: this.#injector });
  }

  protected restore(cell: { readonly row: number; readonly column: string }): void {
    this.mendingChanged.emit(withoutCell(this.mending(), cell));
  }

  protected leaveOut(row: number): void {
    this.mendingChanged.emit(withoutLine(this.mending(), row));
  }

  protected takeBack(row: number): void {
    this.mendingChanged.emit(withLine(this.mending(), row));
  }

  /** Rates, indices and left-out lines are mended where they are entered. */
  protected canMend({ code, column }: ImportFinding): boolean {
    return column !== '' && code !== 'no-rate' && code !== 'no-price-index' && code !== 'mending';
  }
}

import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import type { PanelVersionReply, PanelVersionSummary } from '@contract';
import { Subject, catchError, map, of, startWith, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import { NumberFormat } from '../../ui/number-format';
import { counted, listed } from '../../ui/phrases';
import { ProblemNotice } from '../../ui/problem-notice';
import { columnTitle } from '../panel-rows';
import { type CarryConflict, type Carrying, type EditedVersion, carryOver } from './carry-over';
import { editsWords, partsWords } from './edit-words';
import { figureWords, shiftOf } from './shown-figure';

export interface CarryQuestion {
  /** The version that was changed. */
  readonly version: PanelVersionSummary;
  readonly from: EditedVersion;
  readonly newerId: string;
  /** The newer version, with what was not saved of it. */
  readonly editedAt: (newer: PanelVersionReply) => EditedVersion;
  /** @param mine  keys of the conflicts that go the person's way. */
  readonly carry: (onto: EditedVersion, carrying: Carrying, mine: ReadonlySet<string>) => void;
}

interface Found {
  readonly version: PanelVersionSummary;
  readonly onto: EditedVersion;
  /** Null where the two are in different currencies or units. */
  readonly carrying: Carrying | null;
}

type CarryView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly found: Found }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

type Side = 'mine' | 'theirs';

/** Shows what becomes of edits in a newer version, asks about conflicts; closes with true once they are carried. */
@Component({
  selector: 'kv-carry-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    ProblemNotice,
  ],
  templateUrl: './carry-dialog.html',
  styleUrl: './carry-dialog.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CarryDialog {
  readonly #dialog = inject<MatDialogRef<CarryDialog, boolean>>(MatDialogRef);
  readonly #panels = inject(PanelsApi);
  readonly #numbers = inject(NumberFormat);
  protected readonly question = inject<CarryQuestion>(MAT_DIALOG_DATA);
  readonly #wanted = new Subject<void>();

  protected readonly changes = editsWords(this.question.from.edits);
  protected readonly unit = this.#numbers.unitLabel();
  protected readonly view = signal<CarryView>({ kind: 'loading' });
  protected readonly isAsked = signal(false);
  readonly #choices = signal<ReadonlyMap<string, Side>>(new Map());
  readonly #carrying = computed(() => {
    const view = this.view();
    return view.kind === 'ready' ? view.found.carrying : null;
  });
  protected readonly conflicts = computed(() => this.#carrying()?.conflicts ?? []);
  protected readonly canCarry = computed(() => this.#carrying() !== null);
  readonly #undecided = computed(
    () => this.conflicts().filter(({ key }) => !this.#choices().has(key)).length,
  );
  protected readonly needed = computed(() =>
    this.#undecided() === 0
      ? ''
      : `Still needed: a choice for ${counted(this.#undecided(), 'conflict')}.`,
  );

  constructor() {
    this.#wanted
      .pipe(
        startWith(undefined),
        switchMap(() =>
          this.#panels.version(this.question.newerId).pipe(
            map((newer): CarryView => ({ kind: 'ready', found: this.#found(newer) })),
            catchError((error: unknown) =>
              of<CarryView>({ kind: 'failed', problem: toApiProblem(error) }),
            ),
            startWith<CarryView>({ kind: 'loading' }),
          ),
        ),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.view.set(view);
      });
  }

  protected read(): void {
    this.#wanted.next();
  }

  /** What goes along, what is there already, what stays behind. */
  protected outcomes({ version, carrying }: Found): readonly string[] {
    if (carrying === null) return [];
    const { number } = this.question.version;
    const { cells, added, removed, settled, conflicts, left } = carrying;
    const along = partsWords(cells.length, added.length + removed.length);
    const leftNames = new Set(
      [...left.cells.values()].map(({ place }) => this.question.from.columns[place.column].name),
    );
    return [
      ...(along === '' ? [] : [`Carried: ${along}, unchanged in version ${version.number}.`]),
      ...(settled === 0
        ? []
        : [`In version ${version.number} just so already: ${counted(settled, 'change')}.`]),
      ...(conflicts.length === 0
        ? []
        : [`In conflict: ${counted(conflicts.length, 'change')}; choose below.`]),
      ...(leftNames.size === 0
        ? []
        : [
            `Kept with version ${number}: ${editsWords(left)}; version ${version.number} has no column ${listed([...leftNames].map((name) => `“${name}”`))}.`,
          ]),
    ];
  }

  protected name(conflict: CarryConflict, { columns }: EditedVersion): string {
    if (conflict.kind === 'row') return `Row ${conflict.row.company} ${conflict.row.year}`;
    const { company, year, column } = conflict.place;
    return `${columnTitle(columns[column])}, ${company} ${year}`;
  }

  /** What a side holds, in words. */
  protected words(conflict: CarryConflict, side: Side | 'before', onto: EditedVersion): string {
    if (conflict.kind === 'row')
      return { before: 'in the panel', theirs: 'figures changed', mine: 'removed' }[side];
    const value = conflict[side];
    if (value === undefined) return 'row removed';
    const shift = shiftOf(onto.columns[conflict.place.column], this.#numbers.factor());
    return figureWords(value, shift, this.#numbers.locale());
  }

  protected isChosen({ key }: CarryConflict, side: Side): boolean {
    return this.#choices().get(key) === side;
  }

  protected choose(conflicts: readonly CarryConflict[], side: Side): void {
    this.#choices.update(
      (choices) => new Map([...choices, ...conflicts.map(({ key }) => [key, side] as const)]),
    );
  }

  protected carry(): void {
    this.isAsked.set(true);
    const view = this.view();
    if (view.kind !== 'ready' || view.found.carrying === null || this.#undecided() > 0) return;
    const mine = [...this.#choices()].filter(([, side]) => side === 'mine').map(([key]) => key);
    this.question.carry(view.found.onto, view.found.carrying, new Set(mine));
    this.#dialog.close(true);
  }

  #found(newer: PanelVersionReply): Found {
    const { version, from } = this.question;
    const onto = this.question.editedAt(newer);
    const areAlike =
      newer.version.currency === version.currency && newer.version.unit === version.unit;
    return { version: newer.version, onto, carrying: areAlike ? carryOver(from, onto) : null };
  }
}

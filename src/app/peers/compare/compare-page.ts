import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { CautionLine } from '../../ui/caution-line';
import { EmptyState } from '../../ui/empty-state';
import { NumberFormat } from '../../ui/number-format';
import { PageContext } from '../../ui/page-context';
import { PageHeader } from '../../ui/page-header';
import { counted } from '../../ui/phrases';
import { ProblemNotice } from '../../ui/problem-notice';
import { CompareStore } from './compare-store';
import {
  type DifferenceKind,
  type SaidOf,
  comparisonFinding,
  memberDifferences,
} from './member-differences';
import { membersOf, versionFacts } from './version-facts';
import { versionFits } from './version-fits';

const kindWords: Readonly<Record<DifferenceKind, string>> = {
  side: 'moved',
  known: 'in one panel only',
  reason: 'other reason',
  same: 'same',
};

/** Two versions of the peer group side by side: what each is made of, who differs and why, and what came of them. */
@Component({
  selector: 'kv-peer-compare-page',
  imports: [
    CautionLine,
    EmptyState,
    MatButton,
    MatFormFieldModule,
    MatInput,
    PageHeader,
    ProblemNotice,
    RouterLink,
  ],
  templateUrl: './compare-page.html',
  styleUrl: './compare-page.css',
  providers: [CompareStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeerComparePage {
  readonly #context = inject(PageContext);
  readonly #router = inject(Router);
  readonly #numbers = inject(NumberFormat);
  protected readonly store = inject(CompareStore);

  /** Ids of the two versions. */
  readonly a = input<string>();
  readonly b = input<string>();

  protected readonly counted = counted;
  protected readonly kindWords = kindWords;
  protected readonly shown = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return null;
    const { a, b, versions } = view;
    const differences = memberDifferences(a.group, b.group);
    const sizes = new Map([...membersOf(a), ...membersOf(b)].map((each) => [each.name, each]));
    return {
      versions,
      sides: [a, b] as const,
      finding: comparisonFinding(a.group, b.group, differences),
      facts: versionFacts(a, b, this.#numbers),
      fits: versionFits(a, b, this.#numbers),
      differing: differences.filter(({ kind }) => kind !== 'same'),
      same: differences.filter(({ kind }) => kind === 'same'),
      sizes,
    };
  });

  constructor() {
    effect(() => {
      const [a, b] = [this.a(), this.b()];
      untracked(() => void this.store.load(a, b));
    });
    effect(() => {
      const view = this.store.view();
      if (view.kind !== 'ready') return;
      const { a, b } = view;
      untracked(() => {
        this.#context.show({
          ownCompany: b.group.ownCompany,
          currency: a.panel.currency,
          unit: a.panel.unit,
          lineage: [a, b].map(({ group, panel }, index) => ({
            label: index === 0 ? 'Peers' : 'beside peers',
            version: `v${group.number}`,
            detail: `panel v${panel.number}`,
            link: `/peers/${group.id}`,
          })),
        });
      });
    });
  }

  protected said(said: SaidOf | null): string {
    if (said === null) return 'not in its panel';
    return said.isIncluded ? 'in' : 'out';
  }

  protected choose(change: { readonly a?: string; readonly b?: string }): void {
    const page = this.shown();
    if (page === null) return;
    const [a, b] = page.sides;
    void this.#router.navigate(['/peers/compare'], {
      queryParams: { a: a.group.id, b: b.group.id, ...change },
      replaceUrl: true,
    });
  }
}

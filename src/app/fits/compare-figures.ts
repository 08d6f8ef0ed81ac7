import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { Figure } from '../ui/figure';
import { type FigureKind, NumberFormat } from '../ui/number-format';
import { type FinishedFit, slopeNames } from './compare-words';
import { placesText, regressorWord } from './fit-words';
import { inUnit } from './panel-money';
import { rankedCount } from './standing-words';
import { shortHash } from '../ui/phrases';

interface Cell {
  readonly estimate: number;
  readonly low?: number | null;
  readonly high?: number | null;
  readonly figure: string;
}

interface Line {
  readonly label: string;
  readonly kind: FigureKind;
  readonly a: Cell | null;
  readonly b: Cell | null;
}

/** Standing, slopes and goodness of two fits, line by line; each figure opens its own fit's lineage. */
@Component({
  selector: 'kv-compare-figures',
  imports: [Figure],
  templateUrl: './compare-figures.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompareFigures {
  readonly #numbers = inject(NumberFormat);

  readonly a = input.required<FinishedFit>();
  readonly b = input.required<FinishedFit>();
  /** Keys of figures of the first and of the second fit whose lineage is wanted. */
  readonly openedA = output<string>();
  readonly openedB = output<string>();

  protected readonly names = computed(() => ({
    a: shortHash(this.a().reply.fit.hash),
    b: shortHash(this.b().reply.fit.hash),
  }));
  protected readonly places = computed(() => ({ a: placesOf(this.a()), b: placesOf(this.b()) }));
  protected readonly lines = computed((): readonly Line[] => {
    const [a, b] = [this.a(), this.b()];
    const both = (
      label: string,
      kind: FigureKind,
      of: (fit: FinishedFit) => Cell | null,
    ): Line => ({
      label,
      kind,
      a: of(a),
      b: of(b),
    });
    const share = (label: string, figure: string, of: (fit: FinishedFit) => number): Line =>
      both(label, 'plain', (fit) => ({ estimate: of(fit), figure }));
    return [
      both(`Standing${this.#unitOf()}`, 'money', (fit) => this.#standing(fit)),
      ...slopeNames(a.result, b.result).map((name) =>
        both(`Slope of ${wordOf(name, a, b)}`, 'plain', (fit) => slope(fit, name)),
      ),
      share('R²', 'r-squared', ({ result }) => result.goodness.rSquared),
      share(
        'R² within companies',
        'within-r-squared',
        ({ result }) => result.goodness.withinRSquared,
      ),
      share('R², one pooled line', 'pooled-r-squared', ({ result }) => result.pooled.rSquared),
      both(`Residual standard error${this.#unitOf()}`, 'money', (fit) => ({
        ...this.#inFirstUnit(fit, {
          estimate: fit.result.goodness.residualStandardError,
          low: null,
          high: null,
        }),
        low: undefined,
        high: undefined,
        figure: 'residual-standard-error',
      })),
    ];
  });

  #unitOf(): string {
    const { currency } = this.a().reply.panelVersion;
    const other = this.b().reply.panelVersion.currency;
    return currency === other
      ? `, ${this.#numbers.unitLabel()}`
      : `, ${currency} beside ${other}, ${this.#numbers.unit()}`;
  }

  #standing(fit: FinishedFit): Cell | null {
    const { standing } = fit.result;
    return standing === null ? null : { ...this.#inFirstUnit(fit, standing), figure: 'standing' };
  }

  #inFirstUnit<T extends Parameters<typeof inUnit>[0]>({ reply }: FinishedFit, value: T): T {
    return inUnit(value, reply.panelVersion.unit, this.a().reply.panelVersion.unit);
  }
}

function slope({ result }: FinishedFit, name: string): Cell | null {
  const index = result.slopes.findIndex((each) => each.name === name);
  return index < 0 ? null : { ...result.slopes[index], figure: `slope.${index}` };
}

function wordOf(name: string, a: FinishedFit, b: FinishedFit): string {
  const index = [a, b]
    .map(({ result }) => result.slopes.findIndex((each) => each.name === name))
    .find((place) => place >= 0);
  return regressorWord(name, index ?? -1);
}

function placesOf({ result }: FinishedFit): string {
  return result.standing?.rankSet == null
    ? 'n/a'
    : placesText(result.standing.rankSet, rankedCount(result));
}

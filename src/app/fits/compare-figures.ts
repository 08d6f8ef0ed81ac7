import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { unitText } from '@figures';
import { Figure } from '../ui/figure';
import {
  asDifference,
  differenceKind,
  differenceUnit,
  levelKind,
  levelUnit,
} from '../ui/model-form';
import { type FigureKind, NumberFormat } from '../ui/number-format';
import { type FinishedFit, slopeNames } from './compare-words';
import { placesText, regressorWord, withinName } from './fit-words';
import { inUnit } from './panel-money';
import { rankedCount } from './standing-words';
import { shortHash } from '../ui/phrases';

interface Cell {
  readonly kind: FigureKind;
  readonly estimate: number;
  readonly low?: number | null;
  readonly high?: number | null;
  readonly unbounded?: 'low' | 'high' | 'both';
  readonly figure: string;
}

interface Line {
  readonly label: string;
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
    const both = (label: string, of: (fit: FinishedFit) => Cell | null): Line => ({
      label,
      a: of(a),
      b: of(b),
    });
    const share = (label: string, figure: string, of: (fit: FinishedFit) => number | null): Line =>
      both(label, (fit) => {
        const estimate = of(fit);
        return estimate === null ? null : { kind: 'plain', estimate, figure };
      });
    const measure = this.#beside(({ reply }) =>
      reply.fit.form === 'log' ? 'of logs' : 'of amounts',
    );
    return [
      both(`Standing, ${this.#unitsOf(differenceUnit)}`, (fit) => this.#standing(fit)),
      ...slopeNames(a.result, b.result).map((name) =>
        both(`Slope of ${wordOf(name, a, b)}${this.#slopeUnit()}`, (fit) => slope(fit, name)),
      ),
      share(`R²${measure}`, 'r-squared', ({ result }) => result.goodness.rSquared),
      share(this.#within(), 'within-r-squared', ({ result }) => result.goodness.withinRSquared),
      share(
        `R², one pooled line${measure}`,
        'pooled-r-squared',
        ({ result }) => result.pooled.rSquared,
      ),
      both(`Residual standard error, ${this.#unitsOf(levelUnit)}`, (fit) => this.#residual(fit)),
    ];
  });

  /** What both say, or what each says where they differ: `, of amounts beside of logs`; nothing for two fits in amounts. */
  #beside(of: (fit: FinishedFit) => string): string {
    const [a, b] = [of(this.a()), of(this.b())];
    return a === b ? '' : `, ${a} beside ${b}`;
  }

  #unitsOf(unitOf: typeof levelUnit): string {
    const [a, b] = [this.a(), this.b()].map(({ reply: { fit, panelVersion } }) =>
      fit.form === 'log'
        ? unitOf(fit.form, this.#numbers)
        : unitText(panelVersion.currency, this.#numbers.unit()),
    );
    return a === b ? a : `${a} beside ${b}`;
  }

  #slopeUnit(): string {
    const isLog = [this.a(), this.b()].map(({ reply }) => reply.fit.form === 'log');
    if (isLog.every(Boolean)) return ', percent for 1 %';
    return this.#beside(({ reply }) =>
      reply.fit.form === 'log' ? 'percent for 1 %' : 'amount for 1',
    );
  }

  #within(): string {
    const [a, b] = [this.a(), this.b()].map(({ reply }) => withinName(reply.fit.effects));
    return a === b ? a : 'R² within, each fit’s own effects taken out';
  }

  #standing(fit: FinishedFit): Cell | null {
    const { standing } = fit.result;
    if (standing === null) return null;
    const { form } = fit.reply.fit;
    const shown = form === 'log' ? asDifference(standing, form) : this.#inFirstUnit(fit, standing);
    return { ...shown, kind: differenceKind(form), figure: 'standing' };
  }

  #residual(fit: FinishedFit): Cell {
    const { form } = fit.reply.fit;
    const value = { estimate: fit.result.goodness.residualStandardError, low: null, high: null };
    const { estimate } = form === 'log' ? value : this.#inFirstUnit(fit, value);
    return { estimate, kind: levelKind(form), figure: 'residual-standard-error' };
  }

  #inFirstUnit<T extends Parameters<typeof inUnit>[0]>({ reply }: FinishedFit, value: T): T {
    return inUnit(value, reply.panelVersion.unit, this.a().reply.panelVersion.unit);
  }
}

function slope({ result }: FinishedFit, name: string): Cell | null {
  const index = result.slopes.findIndex((each) => each.name === name);
  return index < 0 ? null : { ...result.slopes[index], kind: 'plain', figure: `slope.${index}` };
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

import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { fixedText, tickDigits } from '@figures';
import { type FigureKind, NumberFormat } from '../number-format';
import { readNumber } from '../number-entry';

const pageSteps = 10;

/**
 * One planned amount: a slider, and a box with − and + that does all the slider does and takes any number exactly.
 * Money goes in and out in the panel's unit and is shown in the person's; plain numbers are as they are. Emits while the slider moves, so
 * that what depends on it can follow at once.
 *
 * `<kv-plan-slider label="Capex FY2026" [value]="1240" [base]="1180" [min]="0" [max]="2400" [step]="10"
 *   [familiar]="{ low: 300, high: 1590 }" (valueChanged)="store.plan(0, 0, $event)" />`
 */
@Component({
  selector: 'kv-plan-slider',
  templateUrl: './plan-slider.html',
  styleUrl: './plan-slider.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanSlider {
  readonly #numbers = inject(NumberFormat);

  /** What is planned and for when: `Capex FY2026`. Names the slider and the box; may be shown by a column's head. */
  readonly label = input.required<string>();
  readonly value = input.required<number>();
  /** The value without a plan; the upright mark. */
  readonly base = input.required<number>();
  readonly min = input.required<number>();
  readonly max = input.required<number>();
  readonly step = input.required<number>();
  /** What the own company and its peers have shown; the thick stretch. */
  readonly familiar = input<{ readonly low: number; readonly high: number } | null>(null);
  readonly kind = input<FigureKind>('money');
  /** Whether only amounts above zero can be read, as where logs are taken of them. */
  readonly isAboveZero = input(false);
  readonly isDisabled = input(false);

  readonly valueChanged = output<number>();

  private readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');

  protected readonly complaint = signal('');
  readonly #digits = computed(() => tickDigits(this.#numbers.shown(this.step(), this.kind())));
  protected readonly text = computed(() => this.#write(this.value()));
  protected readonly spoken = computed(() =>
    this.kind() === 'money' ? `${this.text()} ${this.#numbers.unitLabel()}` : this.text(),
  );
  protected readonly basePlace = computed(() => this.#place(this.base()));
  protected readonly stretch = computed(() => {
    const familiar = this.familiar();
    if (familiar === null) return null;
    const start = this.#place(familiar.low);
    return { start, width: this.#place(familiar.high) - start };
  });
  protected readonly isOutside = computed(() => {
    const familiar = this.familiar();
    return familiar !== null && (this.value() < familiar.low || this.value() > familiar.high);
  });
  /** `+60 against base`; empty at the base. */
  protected readonly difference = computed(() => {
    const difference = this.value() - this.base();
    if (difference === 0) return '';
    return `${difference > 0 ? '+' : ''}${this.#write(difference)} against base`;
  });

  protected slide(text: string): void {
    this.complaint.set('');
    this.valueChanged.emit(Number(text));
  }

  protected slideByPage(event: Event, direction: 1 | -1): void {
    event.preventDefault();
    this.stepBy(direction * pageSteps);
  }

  protected stepBy(steps: number): void {
    const moved = this.value() + steps * this.step();
    this.complaint.set('');
    this.valueChanged.emit(Math.min(this.max(), Math.max(this.min(), moved)));
  }

  protected reset(): void {
    this.complaint.set('');
    this.valueChanged.emit(this.base());
  }

  /** Takes what stands in the box exactly, also beyond the slider's ends. */
  protected take(text: string): void {
    const shown = readNumber(text);
    if (shown === undefined) {
      this.complaint.set(`expected a number, as ${this.text()}; found ${text.trim() || 'nothing'}`);
      return;
    }
    if (this.isAboveZero() && !(shown > 0)) {
      this.complaint.set(
        `expected an amount above zero, for the fit reads logs; found ${text.trim()}`,
      );
      return;
    }
    this.complaint.set('');
    // The same text again is no change: the box may show fewer digits than the value has.
    if (text !== this.text()) this.valueChanged.emit(this.#read(shown));
    this.box().nativeElement.value = this.text();
  }

  protected putBack(): void {
    this.complaint.set('');
    this.box().nativeElement.value = this.text();
  }

  #read(shown: number): number {
    return this.kind() === 'money' ? this.#numbers.toPanelUnit(shown) : shown;
  }

  #write(value: number): string {
    const shown = this.#numbers.shown(value, this.kind());
    const digits = this.#digits();
    const isExact = Math.abs(shown - Number(shown.toFixed(digits))) <= 1e-9 * Math.abs(shown);
    const text = fixedText(shown, isExact ? digits : digits + 3, this.#numbers.locale());
    return isExact ? text : text.replace(/0+$/, '');
  }

  /** Where a value lies between the ends, in percent of the track. */
  #place(value: number): number {
    const span = this.max() - this.min();
    if (!(span > 0)) return 0;
    return Math.min(100, Math.max(0, (100 * (value - this.min())) / span));
  }
}

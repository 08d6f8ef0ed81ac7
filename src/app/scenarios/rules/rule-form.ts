import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { PlanRule } from '@contract';
import { readNumber } from '../../ui/number-entry';
import { NumberFormat } from '../../ui/number-format';
import { regressorKind } from '../../ui/plan/regressor-labels';
import { spreads } from '../../ui/plan/rule-words';
import { type RuleEntry, readRule } from './rule-entry';

type Spread = RuleEntry['spread'];

/** Chooses how one regressor is filled over the planned years. */
@Component({
  selector: 'kv-rule-form',
  imports: [MatButton],
  template: `
    <div class="fields" role="group" [attr.aria-label]="'Rule of ' + label()">
      <label>
        {{ label() }}
        <select #kindBox [value]="kind()" (change)="chooseKind(kindBox.value)">
          <option value="none" [selected]="kind() === 'none'">is entered year by year</option>
          <option value="hold" [selected]="kind() === 'hold'">is held</option>
          <option value="grow" [selected]="kind() === 'grow'">grows by a rate a year</option>
          <option value="total" [selected]="kind() === 'total'">comes to a total</option>
          @if (others().length > 0) {
            <option value="share" [selected]="kind() === 'share'">is a share of another</option>
          }
        </select>
      </label>
      @if (kind() === 'grow' || kind() === 'share') {
        <label>
          {{ kind() === 'grow' ? '% a year' : '%' }}
          <input
            #percentBox
            type="text"
            inputmode="decimal"
            autocomplete="off"
            [value]="percent()"
            (input)="percent.set(percentBox.value)"
            (keydown.enter)="set()"
          />
        </label>
      }
      @if (kind() === 'share') {
        <label>
          of
          <select #ofBox (change)="of.set(+ofBox.value)">
            @for (other of others(); track other.regressor) {
              <option [value]="other.regressor" [selected]="of() === other.regressor">
                {{ other.label }}
              </option>
            }
          </select>
        </label>
      }
      @if (kind() === 'total') {
        <label>
          Total{{ isMoney() ? ', ' + numbers.unitLabel() : '' }}
          <input
            #totalBox
            type="text"
            inputmode="decimal"
            autocomplete="off"
            [value]="total()"
            (input)="total.set(totalBox.value)"
            (keydown.enter)="set()"
          />
        </label>
        <label>
          Spread
          <select #spreadBox (change)="chooseSpread(spreadBox.value)">
            @for (one of spreadNames; track one) {
              <option [value]="one" [selected]="spread() === one">{{ spreads[one] }}</option>
            }
          </select>
        </label>
      }
      <button matButton="outlined" type="button" (click)="set()">Set rule</button>
      <button matButton type="button" (click)="closed.emit()">Cancel</button>
    </div>
    @if (complaint() || refusal(); as words) {
      <p role="alert">{{ words }}</p>
    }
  `,
  styleUrl: '../fields.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleForm {
  protected readonly numbers = inject(NumberFormat);

  readonly labels = input.required<readonly string[]>();
  readonly regressor = input.required<number>();
  readonly rule = input.required<PlanRule | null>();
  /** Why the rule that was set last could not be followed. */
  readonly refusal = input('');
  readonly ruleSet = output<PlanRule | null>();
  readonly closed = output();

  protected readonly spreads = spreads;
  protected readonly spreadNames: readonly Spread[] = ['even', 'rising', 'falling'];
  protected readonly complaint = signal('');
  protected readonly label = computed(() => this.labels()[this.regressor()]);
  protected readonly isMoney = computed(() => regressorKind(this.regressor()) === 'money');
  protected readonly others = computed(() =>
    this.labels().flatMap((label, regressor) =>
      regressor === this.regressor() ? [] : [{ label, regressor }],
    ),
  );
  protected readonly kind = linkedSignal<RuleEntry['kind']>(() => this.rule()?.kind ?? 'none');
  protected readonly percent = linkedSignal(() => {
    const rule = this.rule();
    return rule?.kind === 'grow' || rule?.kind === 'share' ? String(rule.percent) : '';
  });
  protected readonly total = linkedSignal(() => {
    const rule = this.rule();
    return rule?.kind === 'total'
      ? String(Number(this.numbers.shown(rule.total, this.#kindOf()).toPrecision(15)))
      : '';
  });
  protected readonly spread = linkedSignal<Spread>(() => {
    const rule = this.rule();
    return rule?.kind === 'total' ? rule.spread : 'even';
  });
  protected readonly of = linkedSignal(() => {
    const rule = this.rule();
    return rule?.kind === 'share' ? rule.of : (this.others().at(0)?.regressor ?? 0);
  });

  protected chooseKind(text: string): void {
    const kinds: readonly RuleEntry['kind'][] = ['none', 'hold', 'grow', 'total', 'share'];
    this.kind.set(kinds.find((kind) => kind === text) ?? 'none');
    this.complaint.set('');
  }

  protected chooseSpread(text: string): void {
    this.spread.set(this.spreadNames.find((spread) => spread === text) ?? 'even');
  }

  protected set(): void {
    const total = readNumber(this.total());
    const read = readRule({
      kind: this.kind(),
      percent: readNumber(this.percent()),
      total: total !== undefined && this.isMoney() ? this.numbers.toPanelUnit(total) : total,
      spread: this.spread(),
      of: this.of(),
    });
    this.complaint.set(read.kind === 'refused' ? read.reason : '');
    if (read.kind === 'rule') this.ruleSet.emit(read.rule);
  }

  #kindOf() {
    return regressorKind(this.regressor());
  }
}

import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import type { PlanMove, PlanRule } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { capitalised } from '../../ui/plan/plan-words';
import { isBookEquity, moveWords, ruleWords } from '../../ui/plan/rule-words';
import { PlanDesk } from '../plan-desk';
import { ScenarioStore } from '../scenario-store';
import { MoveForm } from './move-form';
import { RuleForm } from './rule-form';

/** How each regressor comes to its planned amounts, a line in words each. */
@Component({
  selector: 'kv-rule-lines',
  imports: [MoveForm, RuleForm],
  template: `
    <ul aria-label="Rules of the plan">
      @for (line of lines(); track line.regressor) {
        <li>
          <p>
            {{ line.words }}.
            <button
              type="button"
              class="kv-link kv-no-print"
              [attr.aria-label]="'Change rule of ' + line.label"
              (click)="open(line.regressor, 'rule')"
            >
              Change rule
            </button>
          </p>
          @for (move of line.moves; track move.year) {
            <p>
              {{ move.words }}.
              <button
                type="button"
                class="kv-link kv-no-print"
                [attr.aria-label]="'Remove ' + move.words"
                (click)="desk.removeMove(line.regressor, move.year)"
              >
                Remove
              </button>
            </p>
          }
          @if (isOpen(line.regressor, 'rule')) {
            <kv-rule-form
              [labels]="labels()"
              [regressor]="line.regressor"
              [rule]="line.rule"
              [refusal]="desk.refusal()"
              (ruleSet)="setRule(line.regressor, $event)"
              (closed)="close()"
            />
          }
          @if (line.isBookEquity) {
            @if (isOpen(line.regressor, 'move')) {
              <kv-move-form
                [years]="years()"
                [refusal]="desk.refusal()"
                (moveAdded)="addMove(line.regressor, $event)"
                (closed)="close()"
              />
            } @else {
              <button
                type="button"
                class="kv-link kv-no-print"
                (click)="open(line.regressor, 'move')"
              >
                Add an equity raise or buyback
              </button>
            }
          }
        </li>
      }
    </ul>
    @if (opened() === null && desk.refusal()) {
      <p role="alert">{{ desk.refusal() }}</p>
    }
  `,
  styles: `
    ul {
      display: grid;
      gap: 8px;
      padding: 0;
      list-style: none;
    }
    li {
      display: grid;
      justify-items: start;
      gap: 4px;
      font-size: 13px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleLines {
  readonly #numbers = inject(NumberFormat);
  readonly #store = inject(ScenarioStore);
  protected readonly desk = inject(PlanDesk);

  protected readonly opened = signal<{
    readonly regressor: number;
    readonly form: 'rule' | 'move';
  } | null>(null);
  protected readonly labels = computed(() => this.#store.ground()?.labels ?? []);
  protected readonly years = computed(() => this.#store.text().plan.map(({ year }) => year));
  protected readonly lines = computed(() => {
    const ground = this.#store.ground();
    if (ground === null) return [];
    const { basis, labels } = ground;
    const years = this.years();
    const span = [years[0], years[years.length - 1]] as const;
    return this.#store.text().rules.map(({ rule, moves }, regressor) => ({
      regressor,
      label: labels[regressor],
      rule,
      isBookEquity: isBookEquity(regressor),
      words: `${capitalised(labels[regressor])} ${ruleWords(rule, { basis, labels, regressor, years: span }, this.#numbers)}`,
      moves: moves.map((move) => ({
        year: move.year,
        words: moveWords(move, regressor, this.#numbers),
      })),
    }));
  });

  protected isOpen(regressor: number, form: 'rule' | 'move'): boolean {
    const opened = this.opened();
    return opened?.regressor === regressor && opened.form === form;
  }

  protected open(regressor: number, form: 'rule' | 'move'): void {
    this.desk.forgetRefusal();
    this.opened.set(this.isOpen(regressor, form) ? null : { regressor, form });
  }

  protected close(): void {
    this.desk.forgetRefusal();
    this.opened.set(null);
  }

  protected setRule(regressor: number, rule: PlanRule | null): void {
    if (this.desk.setRule(regressor, rule)) this.opened.set(null);
  }

  protected addMove(regressor: number, { year, amount }: PlanMove): void {
    if (this.desk.setMove(regressor, year, amount)) this.opened.set(null);
  }
}

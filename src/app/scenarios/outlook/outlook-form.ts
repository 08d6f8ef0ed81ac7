import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import type { PlanOutlook } from '@contract';
import { carryingReason } from '@prediction';
import { readNumber } from '../../ui/number-entry';
import { NumberFormat } from '../../ui/number-format';
import { confidenceText } from '../../ui/phrases';
import { PlanDesk } from '../plan-desk';
import { ScenarioStore } from '../scenario-store';
import { fadingWords } from './outlook-words';

const levels = [0.8, 0.9, 0.95, 0.99];

/** Where the plan starts, what year effect its years have, and how sure its ranges are to be. */
@Component({
  selector: 'kv-outlook-form',
  templateUrl: './outlook-form.html',
  styleUrls: ['../fields.css', './outlook-form.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OutlookForm {
  readonly #desk = inject(PlanDesk);
  readonly #numbers = inject(NumberFormat);
  readonly #store = inject(ScenarioStore);

  protected readonly complaint = signal('');
  protected readonly outlook = computed(() => this.#store.text().outlook);
  readonly #basis = computed(() => this.#store.ground()?.basis ?? null);
  protected readonly canCarry = computed(() => {
    const basis = this.#basis();
    return basis !== null && carryingReason(basis) === undefined;
  });
  protected readonly fading = computed(() => {
    const basis = this.#basis();
    const years = this.#store.text().plan.map(({ year }) => year);
    return basis === null ? '' : fadingWords(basis, years, this.#numbers);
  });
  protected readonly yearEffects = computed(() => this.#basis()?.yearEffects ?? null);
  protected readonly effectKind = computed(() => {
    const { yearEffect } = this.outlook();
    return typeof yearEffect === 'object' ? 'given' : yearEffect;
  });
  protected readonly givenText = computed(() => {
    const { yearEffect } = this.outlook();
    return typeof yearEffect === 'object' ? String(this.#shown(yearEffect.given)) : '';
  });
  protected readonly effectUnit = computed(() =>
    this.#isLog() ? 'natural log' : this.#numbers.unitLabel(),
  );
  protected readonly confidenceLevels = computed(() => levelsWith(this.outlook().confidence));
  protected readonly bandLevels = computed(() => levelsWith(this.outlook().bandConfidence));
  protected readonly levelText = confidenceText;

  protected setStart(start: PlanOutlook['start']): void {
    this.#set({ start });
  }

  protected setEffect(kind: string): void {
    if (kind === 'last' || kind === 'mean-of-last-three') this.#set({ yearEffect: kind });
    else this.#set({ yearEffect: { given: this.yearEffects()?.last ?? 0 } });
  }

  protected setGiven(text: string): void {
    const shown = readNumber(text);
    if (shown === undefined) {
      this.complaint.set(`Expected a number; found ${text.trim() || 'nothing'}.`);
      return;
    }
    const given = this.#isLog() ? shown : this.#numbers.toPanelUnit(shown);
    this.#set({ yearEffect: { given } });
  }

  protected setConfidence(text: string): void {
    this.#set({ confidence: Number(text) });
  }

  protected setBand(text: string): void {
    this.#set({ bandConfidence: Number(text) });
  }

  #set(change: Partial<PlanOutlook>): void {
    this.complaint.set('');
    this.#desk.setOutlook({ ...this.outlook(), ...change });
  }

  #isLog(): boolean {
    return this.#basis()?.form === 'log';
  }

  #shown(given: number): number {
    return Number((this.#isLog() ? given : this.#numbers.shown(given)).toPrecision(15));
  }
}

function levelsWith(level: number): readonly number[] {
  return [...new Set([...levels, level])].sort((a, b) => a - b);
}

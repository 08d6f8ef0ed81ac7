import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  linkedSignal,
  output,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ScenarioVersion } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { ProblemNotice } from '../../ui/problem-notice';
import { ScenarioEdits } from '../scenario-edits';
import { ScenarioStore } from '../scenario-store';
import { toText } from '../scenario-text';
import { textDifferences } from '../text-differences';
import { DifferenceTable } from './difference-table';
import { VersionsStore } from './versions-store';

/** What was stored of the scenario before: by whom, when, how it differs, and the way back to it. */
@Component({
  selector: 'kv-scenario-versions',
  imports: [DatePipe, DifferenceTable, MatButton, ProblemNotice],
  templateUrl: './scenario-versions.html',
  styles: `
    :host,
    section {
      display: grid;
      justify-items: start;
      gap: 8px;
      min-inline-size: 0;
    }
    .kv-table-scroll,
    kv-difference-table {
      max-inline-size: 100%;
    }
    .note {
      white-space: normal;
      overflow-wrap: anywhere;
    }
  `,
  providers: [VersionsStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenarioVersions {
  readonly #edits = inject(ScenarioEdits);
  readonly #numbers = inject(NumberFormat);
  protected readonly store = inject(ScenarioStore);
  protected readonly versions = inject(VersionsStore);

  /** An older version stands on the page, to be saved as a new one. */
  readonly saveWanted = output();

  readonly #saved = computed(() => this.store.ground()?.saved ?? null);
  protected readonly savedVersion = computed(() => this.#saved()?.version);
  protected readonly opened = linkedSignal<string, ScenarioVersion | null>({
    source: () => `${this.#saved()?.id} ${this.savedVersion()}`,
    computation: () => null,
  });
  protected readonly rows = computed(() => {
    const [ground, older] = [this.store.ground(), this.opened()];
    if (ground === null || older === null) return [];
    const { basis, labels } = ground;
    const shown = { basis, labels, numbers: this.#numbers };
    return textDifferences(toText(older), this.store.text(), shown);
  });

  constructor() {
    effect(() => {
      if (this.savedVersion() !== undefined) untracked(() => this.read());
    });
  }

  protected read(): void {
    const saved = this.#saved();
    if (saved !== null) void this.versions.read(saved.id);
  }

  protected toggle(version: ScenarioVersion): void {
    this.opened.update((opened) => (opened?.version === version.version ? null : version));
  }

  protected putBack(older: ScenarioVersion): void {
    const { name, note, ...asked } = toText(older);
    this.#edits.change(asked, { words: `version ${older.version} put back` });
    this.#edits.rename({ name, note });
    this.saveWanted.emit();
  }
}

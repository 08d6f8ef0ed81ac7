import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { ScenarioCopyReply } from '@contract';
import { Mark } from '../../ui/mark';
import { NumberFormat } from '../../ui/number-format';
import { listed } from '../../ui/phrases';
import { ScenarioShelf } from '../scenario-shelf';
import { ScenarioStore } from '../scenario-store';

/** What a copy onto another fit could not take over, and what the two fits say of the same years. */
@Component({
  selector: 'kv-copied-notice',
  imports: [Mark],
  template: `
    @if (copied(); as reply) {
      <div role="status">
        <p>
          <kv-mark kind="fine" /> Copied onto this fit.
          {{ words().join(' ') }}
          <button type="button" class="kv-link" (click)="shelf.forgetCopied()">Close</button>
        </p>
        @if (reply.changes.years.length > 0) {
          <div
            class="kv-table-scroll"
            tabindex="0"
            role="region"
            aria-label="Expected values before and after copying"
          >
            <table class="kv-table">
              <caption>
                Expected value,
                {{
                  numbers.unitLabel()
                }}
              </caption>
              <thead>
                <tr>
                  <th scope="col">Year</th>
                  <th scope="col" class="kv-number">On the fit before</th>
                  <th scope="col" class="kv-number">On this fit</th>
                </tr>
              </thead>
              <tbody>
                @for (row of reply.changes.years; track row.year) {
                  <tr>
                    <th scope="row">FY{{ row.year }}</th>
                    <td class="kv-number">{{ numbers.interval(row.before) }}</td>
                    <td class="kv-number">{{ numbers.interval(row.after) }}</td>
                  </tr>
                }
              </tbody>
            </table>
          </div>
        }
      </div>
    }
  `,
  styles: `
    :host,
    div {
      display: grid;
      gap: 8px;
      min-inline-size: 0;
    }
    :host:empty {
      display: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CopiedNotice {
  readonly #store = inject(ScenarioStore);
  protected readonly numbers = inject(NumberFormat);
  protected readonly shelf = inject(ScenarioShelf);

  protected readonly copied = computed(() => {
    const copied = this.shelf.copied();
    return copied?.scenario.id === this.#store.ground()?.saved?.id ? copied : null;
  });
  protected readonly words = computed(() => changeWords(this.copied()?.changes));
}

/** A sentence for each thing that a copy could not take over as it was. */
export function changeWords(changes: ScenarioCopyReply['changes'] | undefined): readonly string[] {
  if (changes === undefined) return [];
  const years = (list: readonly number[]) => listed(list.map((year) => `FY${year}`));
  const sentences = [
    changes.droppedYears.length > 0 &&
      `Left out, for the panel has observed it: ${years(changes.droppedYears)}.`,
    changes.addedYears.length > 0 &&
      `Added with the last observed values: ${years(changes.addedYears)}.`,
    changes.heldRegressors.length > 0 &&
      `New in this fit, held at the last observed value: ${listed(changes.heldRegressors)}.`,
    changes.droppedRegressors.length > 0 &&
      `Not in this fit any more: ${listed(changes.droppedRegressors)}.`,
    changes.droppedRules.length > 0 &&
      `Amounts stay, but no longer follow a rule, which gives others here: ${listed(changes.droppedRules)}.`,
    ...changes.outlook,
  ].filter((sentence) => typeof sentence === 'string');
  return sentences.length > 0 ? sentences : ['The plan came over as it was.'];
}

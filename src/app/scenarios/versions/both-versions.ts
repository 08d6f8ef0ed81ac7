import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  linkedSignal,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Mark } from '../../ui/mark';
import { NumberFormat } from '../../ui/number-format';
import { mergedTexts } from '../merge-texts';
import { ScenarioStore } from '../scenario-store';
import { toText } from '../scenario-text';
import { textDifferences } from '../text-differences';
import { DifferenceTable } from './difference-table';

/** One's own plan and the version that somebody else saved meanwhile: chosen place by place, or as a whole. */
@Component({
  selector: 'kv-both-versions',
  imports: [DifferenceTable, Mark, MatButton],
  template: `
    @if (store.theirs(); as theirs) {
      <section aria-labelledby="both-title">
        <h2 id="both-title">Two versions of this scenario</h2>
        <p role="alert">
          <kv-mark kind="caution" /> {{ theirs.updatedBy }} saved version
          {{ theirs.version }} meanwhile. Yours is kept as your draft. Choose where they differ;
          both stay: theirs as version {{ theirs.version }}, yours in what you save next.
        </p>
        <kv-difference-table
          label="Where the two versions differ"
          [rows]="rows()"
          leftName="Yours"
          [rightName]="'Theirs, version ' + theirs.version"
          [isChoice]="true"
          [fromRight]="fromTheirs()"
          (chosen)="choose($event.key, $event.side)"
        />
        <div class="actions">
          <button matButton="filled" type="button" (click)="goOn()">Go on with the choice</button>
          <button matButton="outlined" type="button" (click)="takeAll(false)">
            Take all of yours
          </button>
          <button matButton="outlined" type="button" (click)="takeAll(true)">
            Take all of theirs
          </button>
          <button type="button" class="kv-link" (click)="copyWanted.emit()">
            Save yours as a copy
          </button>
        </div>
      </section>
    }
  `,
  styles: `
    section {
      display: grid;
      gap: 12px;
      min-inline-size: 0;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 8px 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BothVersions {
  readonly #numbers = inject(NumberFormat);
  protected readonly store = inject(ScenarioStore);

  readonly copyWanted = output();

  protected readonly fromTheirs = linkedSignal<number | undefined, ReadonlySet<string>>({
    source: () => this.store.theirs()?.version,
    computation: () => new Set<string>(),
  });
  protected readonly rows = computed(() => {
    const [ground, theirs] = [this.store.ground(), this.store.theirs()];
    if (ground === null || theirs === null) return [];
    const { basis, labels } = ground;
    const shown = { basis, labels, numbers: this.#numbers };
    return textDifferences(this.store.text(), toText(theirs), shown);
  });

  protected choose(key: string, side: 'left' | 'right'): void {
    this.fromTheirs.update((keys) => {
      const others = [...keys].filter((other) => other !== key);
      return new Set(side === 'right' ? [...others, key] : others);
    });
  }

  protected takeAll(isTheirs: boolean): void {
    this.fromTheirs.set(new Set(isTheirs ? this.rows().map(({ key }) => key) : []));
    this.goOn();
  }

  protected goOn(): void {
    const [ground, theirs] = [this.store.ground(), this.store.theirs()];
    if (ground === null || theirs === null) return;
    const isWhole = this.rows().every(({ key }) => this.fromTheirs().has(key));
    this.store.meetTheirs(
      isWhole
        ? toText(theirs)
        : mergedTexts(ground.basis, this.store.text(), toText(theirs), this.fromTheirs()),
    );
  }
}

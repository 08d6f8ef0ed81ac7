import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { FitsApi } from '../../api/fits-api';
import { CautionLine } from '../../ui/caution-line';

/** Everything that somebody else needs to compute a fit again, as one file. */
@Component({
  selector: 'kv-replication-link',
  imports: [CautionLine],
  template: `
    <p>
      <a class="kv-no-print" download [href]="address()">Export replication pack</a>
      <span class="kv-caption">
        One zip: the rows used, specification, results, evidence, lineage, cautions, and an R script
        that computes them again.
      </span>
    </p>
    <kv-caution-line />
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    .kv-caption {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReplicationLink {
  readonly #fits = inject(FitsApi);

  readonly fitId = input.required<string>();

  protected readonly address = computed(() => this.#fits.replicationAddress(this.fitId()));
}

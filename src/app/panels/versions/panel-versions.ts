import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { RouterLink } from '@angular/router';
import type { PanelVersionSummary } from '@contract';
import { PanelsApi } from '../../api/panels-api';
import { NumberFormat } from '../../ui/number-format';
import { yearSpan } from '../panel-finding';
import { AskRestore } from './ask-restore';
import { VersionDifferences } from './version-differences';
import { newestOf, orderedPair, originWords } from './version-words';

/** Every panel version: who made it, when, from what and why; two can be compared, each taken out or put back. */
@Component({
  selector: 'kv-panel-versions',
  imports: [DatePipe, MatButton, MatCheckbox, RouterLink, VersionDifferences],
  templateUrl: './panel-versions.html',
  styles: `
    :host {
      display: block;
      min-inline-size: 0;
    }
    .head {
      min-block-size: 40px;
    }
    .kv-caption {
      display: block;
      font-weight: 400;
    }
    th[scope='row'],
    td {
      white-space: nowrap;
    }
    .note {
      min-inline-size: 200px;
      max-inline-size: 360px;
      white-space: normal;
      overflow-wrap: anywhere;
    }
    .kv-total-row td {
      font-weight: 400;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelVersions {
  readonly #panels = inject(PanelsApi);
  readonly #askRestore = inject(AskRestore);
  protected readonly numbers = inject(NumberFormat);

  /** Of every panel, newest first. */
  readonly versions = input.required<readonly PanelVersionSummary[]>();
  /** The version that the page shows. */
  readonly shownId = input.required<string>();
  readonly mayChange = input(false);

  /** Id of the version that holds what an older one held. */
  readonly restored = output<string>();

  protected readonly years = yearSpan;
  readonly #chosen = linkedSignal<readonly PanelVersionSummary[], readonly PanelVersionSummary[]>({
    source: this.versions,
    computation: () => [],
  });
  protected readonly pair = computed(() => orderedPair(this.#chosen()));
  /** The two versions whose differences are shown. */
  protected readonly compared = linkedSignal<
    readonly PanelVersionSummary[],
    readonly [PanelVersionSummary, PanelVersionSummary] | null
  >({ source: this.versions, computation: () => null });

  protected isChosen({ id }: PanelVersionSummary): boolean {
    return this.#chosen().some((version) => version.id === id);
  }

  /** Two of one panel, no more. */
  protected mayChoose(version: PanelVersionSummary): boolean {
    const chosen = this.#chosen();
    if (this.isChosen(version) || chosen.length === 0) return true;
    return chosen.length === 1 && chosen[0].panelId === version.panelId;
  }

  protected choose(version: PanelVersionSummary, isChosen: boolean): void {
    this.#chosen.update((chosen) =>
      isChosen ? [...chosen, version] : chosen.filter(({ id }) => id !== version.id),
    );
  }

  protected origin(version: PanelVersionSummary): string {
    return originWords(version, this.versions());
  }

  protected isNewest(version: PanelVersionSummary): boolean {
    return newestOf(version, this.versions()).id === version.id;
  }

  protected async putBack(version: PanelVersionSummary): Promise<void> {
    const made = await this.#askRestore.ask({
      panelVersionId: version.id,
      number: version.number,
      nextNumber: newestOf(version, this.versions()).number + 1,
    });
    if (made !== undefined) this.restored.emit(made);
  }

  protected exportOf({ id }: PanelVersionSummary, format: 'csv' | 'xlsx'): string {
    return this.#panels.exportAddress(id, format);
  }

  protected address(fileId: string): string {
    return this.#panels.fileAddress(fileId);
  }

  protected kilobytes(byteSize: number): string {
    return byteSize < 1000
      ? `${byteSize} bytes`
      : `${Math.round(byteSize / 1000).toLocaleString('en')} kB`;
  }
}

import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Confidentiality } from '@contract';
import { type EditionFormat, EditionsApi } from '../api/editions-api';
import { Confirm } from '../ui/confirm';
import { NumberFormat } from '../ui/number-format';
import { confidentialityMeaning } from './edition-words';

const files: readonly { readonly label: string; readonly file: EditionFormat }[] = [
  { label: 'PDF, A4', file: { format: 'pdf', paper: 'a4' } },
  { label: 'PDF, Letter', file: { format: 'pdf', paper: 'letter' } },
  { label: 'XLSX', file: { format: 'xlsx' } },
];

/** The edition as a file, its money in the unit shown; of inside information the person is asked first. */
@Component({
  selector: 'kv-edition-exports',
  template: `
    <p>In {{ unit() }}, as shown. Each export is listed on the edition with your name.</p>
    <ul>
      @for (each of links(); track each.label) {
        <li>
          <a [href]="each.address" download (click)="mind($event, each.label)">{{ each.label }}</a>
        </li>
      }
    </ul>
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
      font-size: 13px;
    }
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: 4px 24px;
      padding: 0;
      list-style: none;
    }
    a {
      display: inline-block;
      padding-block: 4px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionExports {
  readonly #api = inject(EditionsApi);
  readonly #confirm = inject(Confirm);
  readonly #numbers = inject(NumberFormat);

  readonly editionId = input.required<string>();
  readonly confidentiality = input.required<Confidentiality>();

  protected readonly unit = this.#numbers.unitLabel;
  protected readonly links = computed(() =>
    files.map(({ label, file }) => ({
      label,
      address: this.#api.exportAddress(this.editionId(), file, this.#numbers.unit()),
    })),
  );
  #isMinded = false;

  /** The link goes on by itself, or once the person has said yes. */
  protected mind(event: Event, label: string): void {
    if (this.confidentiality() !== 'inside-information' || this.#isMinded) return;
    event.preventDefault();
    void this.#ask(event.currentTarget as HTMLAnchorElement, label);
  }

  async #ask(link: HTMLAnchorElement, label: string): Promise<void> {
    const isMinded = await this.#confirm.ask({
      title: `Export as ${label}?`,
      detail: `${confidentialityMeaning['inside-information']} Your name and the time are listed on the edition.`,
      action: `Export as ${label}`,
    });
    if (!isMinded) return;
    this.#isMinded = true;
    link.click();
    this.#isMinded = false;
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { similarNames } from '@panel-data';
import { listed } from '../../ui/phrases';
import type { RowPlace } from './panel-edits';

export interface AddRowQuestion {
  /** Of the panel. */
  readonly companies: readonly string[];
  readonly company: string;
  readonly hasRow: (row: RowPlace) => boolean;
}

const mostNames = 3;

/** Asks which company and year a new row is for, and whether a new name is one of the panel's; closes with them. */
@Component({
  selector: 'kv-add-row-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatFormField,
    MatInput,
    MatLabel,
  ],
  template: `
    <form (submit)="$event.preventDefault(); add()">
      <h2 mat-dialog-title>Add a row</h2>
      <mat-dialog-content>
        <mat-form-field appearance="outline">
          <mat-label>Company of the panel, or a new one</mat-label>
          <input
            #companyBox
            matInput
            name="company"
            list="kv-row-companies"
            maxlength="200"
            autocomplete="off"
            cdkFocusInitial
            [value]="company()"
            (input)="company.set(companyBox.value)"
          />
        </mat-form-field>
        <datalist id="kv-row-companies">
          @for (name of question.companies; track name) {
            <option [value]="name"></option>
          }
        </datalist>
        <mat-form-field appearance="outline">
          <mat-label>Fiscal year</mat-label>
          <input
            #yearBox
            matInput
            name="year"
            inputmode="numeric"
            maxlength="4"
            autocomplete="off"
            [value]="year()"
            (input)="year.set(yearBox.value)"
          />
        </mat-form-field>
        <p role="status">{{ isAsked() ? complaint() || warning() : '' }}</p>
        @if (isAsked() && complaint() === '') {
          @for (name of similar(); track name) {
            <button matButton type="button" class="use" (click)="use(name)">
              Use “{{ name }}”
            </button>
          }
        }
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" [mat-dialog-close]="undefined">Cancel</button>
        <button matButton="filled" type="submit">
          {{ isWarned() ? 'Add as a company of its own' : 'Add row' }}
        </button>
      </mat-dialog-actions>
    </form>
  `,
  styles: `
    mat-dialog-content {
      display: grid;
    }
    /* Room for the label on the box's edge; a margin of the first one would be taken away. */
    mat-form-field {
      padding-block-start: 8px;
    }
    p {
      min-block-size: 20px;
      overflow-wrap: anywhere;
    }
    .use {
      justify-self: start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AddRowDialog {
  readonly #dialog = inject<MatDialogRef<AddRowDialog, RowPlace>>(MatDialogRef);
  protected readonly question = inject<AddRowQuestion>(MAT_DIALOG_DATA);

  private readonly yearBox = viewChild.required<ElementRef<HTMLInputElement>>('yearBox');

  protected readonly company = signal(this.question.company);
  protected readonly year = signal('');
  protected readonly isAsked = signal(false);
  /** The name of which the person was told that it is like another one. */
  readonly #warnedOf = signal('');
  readonly #row = computed((): RowPlace => ({
    company: this.company().trim(),
    year: Number(this.year().trim()),
  }));
  protected readonly complaint = computed(() => {
    const { company, year } = this.#row();
    if (company === '') return 'A row needs a company.';
    if (!/^[1-9]\d{3}$/.test(this.year().trim())) return 'A row needs a year of four digits.';
    return this.question.hasRow({ company, year })
      ? `${company} has a row for ${year} already.`
      : '';
  });

  /** Companies of the panel that a name which it does not have may mean, a few at most. */
  protected readonly similar = computed(() => {
    const { companies } = this.question;
    const { company } = this.#row();
    if (!this.isAsked() || company === '' || companies.includes(company)) return [];
    return similarNames(company, companies).slice(0, mostNames);
  });
  protected readonly isWarned = computed(
    () => this.similar().length > 0 && this.#warnedOf() === this.#row().company,
  );
  protected readonly warning = computed(() => {
    if (this.similar().length === 0) return '';
    const names = listed(
      this.similar().map((name) => `“${name}”`),
      'or',
    );
    return `The panel has no company “${this.#row().company}”. Is it ${names}?`;
  });

  protected add(): void {
    this.isAsked.set(true);
    if (this.complaint() !== '') return;
    if (this.similar().length === 0 || this.isWarned()) this.#dialog.close(this.#row());
    else this.#warnedOf.set(this.#row().company);
  }

  /** The row is for a company that the panel has. */
  protected use(company: string): void {
    this.company.set(company);
    this.add();
    if (this.complaint() !== '') this.yearBox().nativeElement.focus();
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  computed,
  effect,
  inject,
  input,
  output,
  untracked,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatAutocompleteModule } from '@angular/material/autocomplete';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { ImportMapping, type ImportReply, type PanelVersionSummary } from '@contract';
import { map } from 'rxjs';
import { byContract, errorWords } from '../../ui/contract-validator';
import { currencyNames, matchingCurrencies } from './currency-codes';
import {
  type ColumnChoiceKey,
  type MappingEntry,
  columnChoices,
  doubleChoices,
  versionWords,
} from './mapping-entry';

const { panelName, currency, unit } = ImportMapping.shape;

/** The entries that the form is about. */
export type FormEntry = Pick<MappingEntry, ColumnChoiceKey | 'panelName' | 'currency' | 'unit'>;

/** Which column of the file is what, in which currency and unit, and what the panel is called. */
@Component({
  selector: 'kv-mapping-form',
  imports: [
    MatAutocompleteModule,
    MatFormFieldModule,
    MatInputModule,
    MatSelectModule,
    ReactiveFormsModule,
  ],
  templateUrl: './mapping-form.html',
  styleUrl: './mapping-form.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MappingForm {
  readonly #build = inject(NonNullableFormBuilder);
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef);

  readonly draft = input.required<ImportReply>();
  readonly versions = input.required<readonly PanelVersionSummary[]>();
  /** What the form starts from; another one fills the form anew. */
  readonly start = input.required<MappingEntry>();

  readonly entryChanged = output<FormEntry>();

  protected readonly choices = columnChoices;
  protected readonly units = unit.options;
  protected readonly words = errorWords;
  protected readonly form = this.#build.group({
    company: ['', [this.#choice()]],
    year: ['', [this.#choice()]],
    marketValue: ['', [this.#choice()]],
    capex: ['', [this.#choice()]],
    bookEquity: ['', [this.#choice()]],
    currency: ['', [byContract(currency, 'expected a currency code of three letters, as EUR')]],
    unit: ['' as MappingEntry['unit'], [byContract(unit, 'expected a unit')]],
    panelName: ['', [byContract(panelName, 'expected a name for the panel')]],
  });
  readonly #changes = this.form.valueChanges.pipe(map(() => this.form.getRawValue()));
  protected readonly entry = toSignal(this.#changes, { initialValue: this.form.getRawValue() });
  protected readonly panelWords = computed(() =>
    versionWords(this.entry().panelName, this.versions()),
  );
  protected readonly panelNames = computed(() => [
    ...new Set(this.versions().map((version) => version.panelName)),
  ]);
  readonly #allCurrencies = currencyNames();
  protected readonly currencies = computed(() =>
    matchingCurrencies(this.entry().currency, this.#allCurrencies),
  );
  constructor() {
    effect(() => {
      const start = this.start();
      untracked(() => this.form.reset(start));
    });
    effect(() => this.entryChanged.emit(this.entry()));
  }

  protected sampleOf(header: string): string {
    const { headers, firstRows } = this.draft();
    const column = headers.indexOf(header);
    return firstRows
      .slice(0, 3)
      .map((row) => row.cells[column] || 'empty')
      .join(', ');
  }

  /** Codes are written in capitals, however they were typed. */
  protected capitalise(): void {
    const control = this.form.controls.currency;
    control.setValue(control.value.trim().toUpperCase());
  }

  /** Shows what is missing and goes to the first of it. @returns whether nothing is. */
  validate(): boolean {
    this.capitalise();
    for (const { key } of columnChoices) this.form.controls[key].updateValueAndValidity();
    this.form.markAllAsTouched();
    if (this.form.invalid)
      this.#host.nativeElement
        .querySelector<HTMLElement>('mat-select.ng-invalid, input.ng-invalid')
        ?.focus();
    return this.form.valid;
  }

  /** One column for one thing: every choice looks at the others. */
  #choice(): (control: { readonly value: string }) => { readonly words: string } | null {
    return (control) => {
      if (control.value === '') return { words: 'expected a column of the file' };
      const controls = this.form?.controls;
      if (controls === undefined) return null;
      const isDouble = doubleChoices(this.form.getRawValue()).some(
        (key: ColumnChoiceKey) => controls[key] === control,
      );
      return isDouble ? { words: `“${control.value}” is chosen for two things` } : null;
    };
  }
}

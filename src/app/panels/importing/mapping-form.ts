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
import { MatButtonModule } from '@angular/material/button';
import { MatCheckboxModule } from '@angular/material/checkbox';
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
  furtherColumns,
  versionWords,
} from './mapping-entry';

const { panelName, currency, unit } = ImportMapping.shape;

/** Which column of the file is what, in which currency and unit, and what the panel is called. */
@Component({
  selector: 'kv-mapping-form',
  imports: [
    MatAutocompleteModule,
    MatButtonModule,
    MatCheckboxModule,
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
  /** What the form starts from; read anew for another import only. */
  readonly start = input.required<MappingEntry>();
  readonly isChecking = input(false);
  /** Whether what is entered is what was checked: then there is nothing to check. */
  readonly isChecked = input(false);

  readonly entryChanged = output<MappingEntry>();
  readonly checkWanted = output<ImportMapping>();

  protected readonly choices = columnChoices;
  protected readonly units = unit.options;
  protected readonly words = errorWords;
  protected readonly form = this.#build.group({
    company: ['', [this.#choice()]],
    year: ['', [this.#choice()]],
    marketValue: ['', [this.#choice()]],
    capex: ['', [this.#choice()]],
    bookEquity: ['', [this.#choice()]],
    others: [[] as string[]],
    currency: ['', [byContract(currency, 'expected a currency code of three letters, as EUR')]],
    unit: ['' as MappingEntry['unit'], [byContract(unit, 'expected a unit')]],
    panelName: ['', [byContract(panelName, 'expected a name for the panel')]],
  });
  readonly #changes = this.form.valueChanges.pipe(map(() => this.form.getRawValue()));
  protected readonly entry = toSignal(this.#changes, { initialValue: this.form.getRawValue() });
  protected readonly further = computed(() => furtherColumns(this.draft(), this.entry()));
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
  /** A ticked column that was chosen for something else since comes along only once. */
  readonly #wantedOthers = computed(() => {
    const further = this.further();
    return this.entry().others.filter((name) => further.includes(name));
  });
  readonly #importId = computed(() => this.draft().id);

  constructor() {
    effect(() => {
      this.#importId();
      untracked(() => {
        this.form.reset({ ...this.start(), others: [...this.start().others] });
      });
    });
    effect(() => {
      this.entryChanged.emit({ ...this.entry(), others: this.#wantedOthers() });
    });
  }

  protected sampleOf(header: string): string {
    const { headers, firstRows } = this.draft();
    const column = headers.indexOf(header);
    return firstRows
      .slice(0, 3)
      .map((row) => row.cells[column] || 'empty')
      .join(', ');
  }

  protected setFurther(header: string, isWanted: boolean): void {
    const rest = this.form.controls.others.value.filter((name) => name !== header);
    this.form.controls.others.setValue(isWanted ? [...rest, header] : rest);
  }

  /** Codes are written in capitals, however they were typed. */
  protected capitalise(): void {
    const control = this.form.controls.currency;
    control.setValue(control.value.trim().toUpperCase());
  }

  protected check(): void {
    this.capitalise();
    for (const { key } of columnChoices) this.form.controls[key].updateValueAndValidity();
    this.form.markAllAsTouched();
    if (this.form.invalid) {
      this.#host.nativeElement
        .querySelector<HTMLElement>('mat-select.ng-invalid, input.ng-invalid')
        ?.focus();
      return;
    }
    this.checkWanted.emit(
      ImportMapping.parse({ ...this.form.getRawValue(), others: this.#wantedOthers() }),
    );
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

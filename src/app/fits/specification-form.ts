import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatRadioModule } from '@angular/material/radio';
import { MatSelectModule } from '@angular/material/select';
import { type Effects, type Lag, type ModelForm, Seed, type SlopeCovariance } from '@contract';
import { byContract, errorWords } from '../ui/contract-validator';
import { confidenceText } from '../ui/phrases';
import { covarianceDetail, covarianceGroups } from '../ui/covariance-words';

export interface Specification {
  readonly effects: Effects;
  readonly form: ModelForm;
  readonly lag: Lag;
  readonly slopes: SlopeCovariance;
  /** Of the wild bootstrap's draws. */
  readonly seed?: number;
  readonly confidence: number;
  readonly furtherRegressors: readonly string[];
}

export const defaultSpecification: Specification = {
  effects: 'company',
  form: 'levels',
  lag: 0,
  slopes: 'cr2',
  confidence: 0.95,
  furtherRegressors: [],
};

const firstSeed = 1;

/** What of a fit can be chosen; what it starts with is right for most. */
@Component({
  selector: 'kv-specification-form',
  imports: [
    MatButton,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    MatRadioModule,
    MatSelectModule,
    ReactiveFormsModule,
  ],
  templateUrl: './specification-form.html',
  styleUrl: './specification-form.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpecificationForm {
  readonly #build = inject(NonNullableFormBuilder);

  readonly specification = input<Specification>(defaultSpecification);
  /** Further numeric columns of the panel. */
  readonly columns = input<readonly string[]>([]);
  readonly isBusy = input(false);
  readonly started = output<Specification>();

  protected readonly groups = covarianceGroups;
  protected readonly confidences = computed(() => {
    const levels = [0.9, 0.95, 0.99];
    const { confidence } = this.specification();
    return levels.includes(confidence) ? levels : [...levels, confidence];
  });
  protected readonly form = this.#build.group({
    effects: this.#build.control(defaultSpecification.effects),
    form: this.#build.control(defaultSpecification.form),
    lag: this.#build.control(defaultSpecification.lag),
    slopes: this.#build.control(defaultSpecification.slopes),
    seed: this.#build.control(firstSeed, byContract(Seed)),
    confidence: this.#build.control(defaultSpecification.confidence),
    further: this.#build.record<boolean>({}),
  });
  protected readonly slopes = toSignal(this.form.controls.slopes.valueChanges, {
    initialValue: defaultSpecification.slopes,
  });
  protected readonly covarianceDetail = computed(() => covarianceDetail(this.slopes()));
  protected readonly isDrawn = computed(() => this.slopes() === 'wild');

  constructor() {
    effect(() => {
      const { furtherRegressors, seed = firstSeed, ...rest } = this.specification();
      const { further } = this.form.controls;
      for (const name of this.columns())
        further.setControl(name, this.#build.control(furtherRegressors.includes(name)));
      this.form.patchValue({ ...rest, seed });
    });
  }

  protected readonly confidenceText = confidenceText;
  protected readonly errorWords = errorWords;

  protected start(): void {
    const { further, seed, ...rest } = this.form.getRawValue();
    const isDrawn = rest.slopes === 'wild';
    if (isDrawn && this.form.controls.seed.invalid) return;
    this.started.emit({
      ...rest,
      ...(isDrawn && { seed }),
      furtherRegressors: this.columns().filter((name) => further[name]),
    });
  }
}

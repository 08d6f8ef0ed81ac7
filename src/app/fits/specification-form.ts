import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { output } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatRadioModule } from '@angular/material/radio';
import type { SlopeCovariance } from '@contract';
import { covarianceWords } from './covariance-words';
import { confidenceText } from '../ui/phrases';

export interface Specification {
  readonly slopes: SlopeCovariance;
  readonly confidence: number;
  readonly furtherRegressors: readonly string[];
}

export const defaultSpecification: Specification = {
  slopes: 'cr2',
  confidence: 0.95,
  furtherRegressors: [],
};

/** What of a fit can be chosen; what it starts with is right for most. */
@Component({
  selector: 'kv-specification-form',
  imports: [MatButton, MatCheckbox, MatRadioModule, ReactiveFormsModule],
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

  protected readonly covariances = covarianceWords;
  protected readonly confidences = computed(() => {
    const levels = [0.9, 0.95, 0.99];
    const { confidence } = this.specification();
    return levels.includes(confidence) ? levels : [...levels, confidence];
  });
  protected readonly form = this.#build.group({
    slopes: this.#build.control<SlopeCovariance>(defaultSpecification.slopes),
    confidence: this.#build.control(defaultSpecification.confidence),
    further: this.#build.record<boolean>({}),
  });

  constructor() {
    effect(() => {
      const { slopes, confidence, furtherRegressors } = this.specification();
      const { further } = this.form.controls;
      for (const name of this.columns())
        further.setControl(name, this.#build.control(furtherRegressors.includes(name)));
      this.form.patchValue({ slopes, confidence });
    });
  }

  protected readonly confidenceText = confidenceText;

  protected start(): void {
    const { slopes, confidence, further } = this.form.getRawValue();
    const furtherRegressors = this.columns().filter((name) => further[name]);
    this.started.emit({ slopes, confidence, furtherRegressors });
  }
}

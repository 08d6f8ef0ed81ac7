import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Evidence, FitResult } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { EvidenceBlock } from './evidence-block';
import { testLines, testsMeaning } from './test-words';

/** Every test that was looked at, with its reading. */
@Component({
  selector: 'kv-tests-block',
  imports: [EvidenceBlock],
  templateUrl: './tests-block.html',
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TestsBlock {
  readonly #numbers = inject(NumberFormat);

  readonly result = input.required<FitResult>();
  readonly evidence = input.required<Evidence>();

  protected readonly meaning = computed(() => testsMeaning(this.evidence().tests, this.result()));
  protected readonly lines = computed(() => testLines(this.evidence().tests, this.#numbers));
}

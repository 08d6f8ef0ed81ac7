import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import type { EditionVerification as Verification } from '@contract';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from '../api/api-problem';
import { EditionsApi } from '../api/editions-api';
import { Mark } from '../ui/mark';
import { ProblemNotice } from '../ui/problem-notice';

/** Has the server compute the edition's hash anew and hold it against those recorded. */
@Component({
  selector: 'kv-edition-verification',
  imports: [DatePipe, Mark, ProblemNotice],
  template: `
    <button type="button" class="kv-link" [disabled]="isChecking()" (click)="check()">
      Check the record
    </button>
    <div role="status">
      @if (found(); as record) {
        <p>
          <kv-mark [kind]="record.isUnchanged ? 'fine' : 'error'" /> {{ record.detail }} Checked
          {{ record.checkedAt | date: 'd MMM y, HH:mm' }}.
        </p>
        <dl class="kv-caption">
          @for (hash of hashesOf(record); track hash.label) {
            <div>
              <dt>{{ hash.label }}</dt>
              <dd class="kv-number">{{ hash.value ?? 'no record' }}</dd>
            </div>
          }
        </dl>
      }
    </div>
    @if (problem(); as refused) {
      <kv-problem-notice [problem]="refused.shown" />
    }
  `,
  styles: `
    :host,
    dl,
    [role='status'] {
      display: grid;
      gap: 8px;
      justify-items: start;
      min-inline-size: 0;
    }
    dl {
      margin: 0;
    }
    dd {
      margin: 0;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionVerification {
  readonly #api = inject(EditionsApi);

  readonly editionId = input.required<string>();

  protected readonly isChecking = signal(false);
  protected readonly found = linkedSignal<string, Verification | null>({
    source: this.editionId,
    computation: () => null,
  });
  protected readonly problem = signal<ApiProblem | null>(null);

  protected hashesOf(record: Verification) {
    return [
      { label: 'SHA-256 of the content as it is stored now', value: record.computedSha256 },
      { label: 'stored with it', value: record.storedSha256 },
      { label: 'recorded when it was published', value: record.publishedSha256 },
      { label: 'recorded when it was signed', value: record.signedSha256 },
    ];
  }

  protected async check(): Promise<void> {
    const id = this.editionId();
    this.isChecking.set(true);
    this.problem.set(null);
    try {
      const found = await firstValueFrom(this.#api.verify(id));
      if (id === this.editionId()) this.found.set(found);
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.problem.set(error);
    } finally {
      this.isChecking.set(false);
    }
  }
}

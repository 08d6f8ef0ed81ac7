import { Injectable, inject, signal } from '@angular/core';
import type { StartFit } from '@contract';
import { firstValueFrom } from 'rxjs';
import type * as z from 'zod';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { FitsApi } from '../api/fits-api';

/** Starts fits, one at a time. */
@Injectable()
export class FitStarter {
  readonly #fits = inject(FitsApi);
  readonly #problem = signal<ApiProblem | null>(null);
  readonly #isStarting = signal(false);

  /** Why the last one could not be started. */
  readonly problem = this.#problem.asReadonly();
  readonly isStarting = this.#isStarting.asReadonly();

  /** @returns the id of the new fit, or of the same one that exists; null when it could not be started. */
  async start(request: z.input<typeof StartFit>): Promise<string | null> {
    this.#isStarting.set(true);
    this.#problem.set(null);
    try {
      return (await firstValueFrom(this.#fits.start(request))).fit.id;
    } catch (error) {
      this.#problem.set(toApiProblem(error));
      return null;
    } finally {
      this.#isStarting.set(false);
    }
  }
}

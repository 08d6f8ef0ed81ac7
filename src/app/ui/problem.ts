import { Injectable, signal } from '@angular/core';

/** A problem in the reader's terms: what was wanted, what was found, what to do. */
export interface ShownProblem {
  readonly title: string;
  readonly detail?: string;
  readonly whatToDo?: string;
  /** The request's id, for whoever looks into it. */
  readonly requestId?: string;
  /** The places concerned, as `line 17, column capex: found "abc"`. */
  readonly places?: readonly string[];
}

/** The one problem that the banner at the top shows: for what belongs to no place on the page. */
@Injectable({ providedIn: 'root' })
export class ProblemBannerState {
  readonly #problem = signal<ShownProblem | null>(null);
  readonly problem = this.#problem.asReadonly();

  report(problem: ShownProblem): void {
    this.#problem.set(problem);
  }

  dismiss(): void {
    this.#problem.set(null);
  }
}

import type { FormControl } from '@angular/forms';
import type { ApiProblem } from '../api/api-problem';
import type { ShownProblem } from '../ui/problem';
import { rawWords } from '../ui/contract-validator';

/** A field of a form with the name that stands on it and its place in the request. */
export interface EntryField {
  readonly label: string;
  /** JSON pointer in the request, as `/email`. */
  readonly pointer: string;
  readonly control: FormControl<string>;
}

/** What the fields themselves find wrong, for the notice above them; null when nothing is. */
export function entryProblem(fields: readonly EntryField[]): ShownProblem | null {
  const wrong = fields.filter(({ control }) => control.invalid);
  if (wrong.length === 0) return null;
  return {
    title:
      wrong.length === 1
        ? 'One field needs another entry'
        : `${wrong.length} fields need another entry`,
    detail: 'Nothing was sent yet.',
    places: wrong.map(({ label, control }) => `${label}: ${rawWords(control)}`),
  };
}

/** Puts what the server finds wrong beside the fields concerned, and gives the words for the notice. */
export function serverProblem(problem: ApiProblem, fields: readonly EntryField[]): ShownProblem {
  for (const { pointer, control } of fields) {
    const words = problem.fieldError(pointer);
    if (words === undefined) continue;
    control.setErrors({ words });
    control.markAsTouched();
  }
  const { requestId, ...shown } = problem.shown;
  // A refusal is explained by its words; the request's id helps only where the fault is the server's.
  return problem.problem.status < 500 || requestId === undefined ? shown : { ...shown, requestId };
}

import type { AbstractControl, ValidationErrors, ValidatorFn } from '@angular/forms';
import type * as z from 'zod';

/**
 * The contract's own rule as a form's, so that the form and the server agree.
 *
 * @param missing  what is said of an empty field, as `expected your name`; without it the rule itself decides.
 * @returns a validator whose error is `{ words }`: what was wanted and, where it helps, what was found.
 */
export function byContract(schema: z.ZodType, missing?: string): ValidatorFn {
  return ({ value }: AbstractControl<unknown>): ValidationErrors | null => {
    if (value === '' && missing !== undefined) return { words: missing };
    const parsed = schema.safeParse(value);
    if (parsed.success) return null;
    const [issue] = parsed.error.issues;
    const isLength = issue.code === 'too_small' || issue.code === 'too_big';
    const found = isLength && typeof value === 'string' ? `; found ${value.length}` : '';
    return { words: issue.message + found };
  };
}

/** The error of a field as the sentence that stands under it; empty where there is none. */
export function errorWords(control: AbstractControl): string {
  const words = rawWords(control);
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** The same words to go on after a colon: `expected your name`. */
export function rawWords(control: AbstractControl): string {
  const words: unknown = control.getError('words');
  return typeof words === 'string' ? words : '';
}

import { ParseRefused } from '../compute/parse-process';
import { AppError, Invalid, Unprocessable } from '../errors/app-error';

/** Gives the reader's refusals their problem types; the upload rules' own code goes with them as `code`. */
export async function refuseUnreadable<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof ParseRefused) throw toProblem(error);
    throw error;
  }
}

function toProblem({ code, message }: ParseRefused): AppError {
  switch (code) {
    case 'type_not_allowed':
      return new AppError('type-not-allowed', 415, message, { code });
    case 'zip_limit':
    case 'sheet_limit':
      return new AppError('too-large', 413, message, { code });
    case 'reading_invalid':
      return new Invalid(message);
    default:
      return new Unprocessable(message, 'unreadable-file', { code });
  }
}

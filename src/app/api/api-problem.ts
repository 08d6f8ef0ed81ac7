import { HttpErrorResponse } from '@angular/common/http';
import { Problem, type ProblemSlug, problemSlug } from '@contract';

/** An error reply of the API, or that there was none. Switch on `slug`, never on the words. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';

  constructor(
    readonly slug: ProblemSlug | 'unreachable' | 'unexpected-reply',
    readonly problem: Problem,
  ) {
    super(problem.detail ?? problem.title);
  }

  /** The words of the problem as a notice shows them. */
  get shown(): {
    readonly title: string;
    readonly detail?: string;
    readonly requestId?: string;
    readonly places?: readonly string[];
  } {
    const { title, detail, status, instance, errors } = this.problem;
    return {
      title,
      ...(detail === undefined ? {} : { detail }),
      // Whoever looks into a fault of ours needs the id; for the person's own slip it is noise.
      ...(instance === undefined || status < 500 ? {} : { requestId: instance }),
      ...(errors === undefined ? {} : { places: errors.map(placed) }),
    };
  }

  /** What is wrong with the field at this JSON pointer, as `/email`. */
  fieldError(pointer: string): string | undefined {
    return this.problem.errors?.find((error) => error.pointer === pointer)?.detail;
  }
}

/** The problem in an HTTP error: the server's own, or that the server did not answer. */
export function toApiProblem(error: unknown): ApiProblem {
  if (error instanceof ApiProblem) return error;
  if (!(error instanceof HttpErrorResponse)) throw error;
  const sent: unknown = error.error;
  const text = sent instanceof ArrayBuffer ? new TextDecoder().decode(sent) : sent;
  const body = typeof text === 'string' ? readJson(text) : text;
  const parsed = Problem.safeParse(body);
  if (parsed.success) return new ApiProblem(problemSlug(parsed.data.type), parsed.data);
  return new ApiProblem('unreachable', {
    type: 'about:blank',
    status: error.status,
    title: 'The server does not answer',
    detail: 'Nothing you entered is lost. Check the connection and try again.',
  });
}

/** `cells 3, value: expected a number; found nothing` of `/cells/2/value`. */
function placed({ pointer, detail }: { pointer: string; detail: string }): string {
  const place = pointer
    .slice(1)
    .replace(/\/(\d+)(?=\/|$)/g, (_, index: string) => ` ${Number(index) + 1}`)
    .replaceAll('/', ', ')
    .replace(
      /(\p{Ll})(\p{Lu})/gu,
      (_, end: string, start: string) => `${end} ${start.toLowerCase()}`,
    );
  return place === '' ? detail : `${place}: ${detail}`;
}

function readJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) return undefined;
    throw error;
  }
}

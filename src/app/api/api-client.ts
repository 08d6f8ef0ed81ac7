import { HttpClient, HttpEventType } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { Router } from '@angular/router';
import type { ApiRoute } from '@contract';
import {
  type Observable,
  type MonoTypeOperatorFunction,
  catchError,
  concatMap,
  map,
  of,
} from 'rxjs';
import type * as z from 'zod';
import { ApiProblem, toApiProblem } from './api-problem';
import { SessionStore } from './session-store';

export interface CallOptions {
  /** Values of the path's `:parameters`. */
  readonly path?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string>>;
  readonly body?: unknown;
}

/** A request with a file: under way, or answered. */
export type Sending<T> =
  /** `share` of the bytes that have gone, 0 to 1; null where the browser does not know. */
  | { readonly kind: 'sending'; readonly share: number | null }
  | { readonly kind: 'answered'; readonly reply: T };

/** Calls routes of the access table and checks each reply by the contract; errors come as `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class ApiClient {
  readonly #http = inject(HttpClient);
  readonly #sessions = inject(SessionStore);
  readonly #router = inject(Router);

  call<T extends z.ZodType>(
    route: ApiRoute,
    reply: T,
    options: CallOptions = {},
  ): Observable<z.output<T>> {
    return this.#request(route, options).pipe(map((body) => checked(body, reply)));
  }

  /** A call with a file as its body, with how much of it has been sent. */
  sendFile<T extends z.ZodType>(
    route: ApiRoute,
    reply: T,
    body: FormData,
  ): Observable<Sending<z.output<T>>> {
    const options = { body, reportProgress: true, observe: 'events' } as const;
    return this.#http.request<unknown>(route.method, addressOf(route, {}), options).pipe(
      concatMap((event): Observable<Sending<z.output<T>>> => {
        if (event.type === HttpEventType.UploadProgress)
          return of({ kind: 'sending', share: event.total ? event.loaded / event.total : null });
        if (event.type === HttpEventType.Response)
          return of({ kind: 'answered', reply: checked(event.body, reply) });
        return of();
      }),
      this.#asProblem(),
    );
  }

  /** A call that is answered without a body. */
  send(route: ApiRoute, options: CallOptions = {}): Observable<void> {
    return this.#request(route, options).pipe(map(() => undefined));
  }

  /** A call that is answered with a file. */
  file(route: ApiRoute, options: CallOptions): Observable<Blob> {
    return this.#http
      .request(route.method, addressOf(route, options.path ?? {}), {
        body: options.body,
        responseType: 'arraybuffer', // a problem in its place can be read at once, which a blob cannot
        observe: 'response',
      })
      .pipe(
        map(
          ({ body, headers }) =>
            new Blob([body ?? ''], { type: headers.get('Content-Type') ?? '' }),
        ),
        this.#asProblem(),
      );
  }

  #request(route: ApiRoute, options: CallOptions): Observable<unknown> {
    return this.#http
      .request(route.method, addressOf(route, options.path ?? {}), {
        ...(options.body === undefined ? {} : { body: options.body }),
        ...(options.query === undefined ? {} : { params: { ...options.query } }),
      })
      .pipe(this.#asProblem());
  }

  #asProblem<T>(): MonoTypeOperatorFunction<T> {
    return catchError((error: unknown) => {
      const problem = toApiProblem(error);
      if (problem.slug === 'not-signed-in') this.#signInAgain();
      throw problem;
    });
  }

  #signInAgain(): void {
    this.#sessions.forget();
    void this.#router.navigate(['/sign-in'], { queryParams: { next: this.#router.url } });
  }
}

function checked<T extends z.ZodType>(body: unknown, reply: T): z.output<T> {
  const parsed = reply.safeParse(body);
  if (parsed.success) return parsed.data;
  throw new ApiProblem('unexpected-reply', {
    type: 'about:blank',
    status: 200,
    title: 'The server answered something this page does not understand',
    detail: 'The page may be out of date. Load it again.',
  });
}

/** The route's address with its parameters filled in. */
export function addressOf(route: ApiRoute, parameters: Readonly<Record<string, string>>): string {
  return route.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(parameters[name]));
}

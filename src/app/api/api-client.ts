import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { Router } from '@angular/router';
import type { ApiRoute } from '@contract';
import { type Observable, catchError, map } from 'rxjs';
import type * as z from 'zod';
import { ApiProblem, toApiProblem } from './api-problem';
import { SessionStore } from './session-store';

export interface CallOptions {
  /** Values of the path's `:parameters`. */
  readonly path?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string>>;
  readonly body?: unknown;
}

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
    return this.#request(route, options).pipe(
      map((body) => {
        const parsed = reply.safeParse(body);
        if (parsed.success) return parsed.data;
        throw new ApiProblem('unexpected-reply', {
          type: 'about:blank',
          status: 200,
          title: 'The server answered something this page does not understand',
          detail: 'The page may be out of date. Load it again.',
        });
      }),
    );
  }

  /** A call that is answered without a body. */
  send(route: ApiRoute, options: CallOptions = {}): Observable<void> {
    return this.#request(route, options).pipe(map(() => undefined));
  }

  #request(route: ApiRoute, options: CallOptions): Observable<unknown> {
    return this.#http
      .request(route.method, addressOf(route, options.path ?? {}), {
        ...(options.body === undefined ? {} : { body: options.body }),
        ...(options.query === undefined ? {} : { params: { ...options.query } }),
      })
      .pipe(
        catchError((error: unknown) => {
          const problem = toApiProblem(error);
          if (problem.slug === 'not-signed-in') this.#signInAgain();
          throw problem;
        }),
      );
  }

  #signInAgain(): void {
    this.#sessions.forget();
    void this.#router.navigate(['/sign-in'], { queryParams: { next: this.#router.url } });
  }
}

/** The route's address with its parameters filled in. */
export function addressOf(route: ApiRoute, parameters: Readonly<Record<string, string>>): string {
  return route.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(parameters[name]));
}

import {
  type ElementRef,
  Injectable,
  Injector,
  afterNextRender,
  inject,
  signal,
} from '@angular/core';
import type { FormControl } from '@angular/forms';
import { Router } from '@angular/router';
import { type SessionReply, landingPath } from '@contract';
import { type Observable, firstValueFrom } from 'rxjs';
import { ApiProblem } from '../api/api-problem';
import { SessionStore } from '../api/session-store';
import type { ShownProblem } from '../ui/problem';
import { type EntryField, entryProblem, serverProblem } from './entry-problem';

export interface Entry {
  readonly fields: readonly EntryField[];
  readonly form: ElementRef<HTMLElement>;
  readonly send: () => Observable<SessionReply>;
  /** The page to go to; null for the first page of the person's roles. */
  readonly next: string | null;
  /** Words for the password's field when it is not the account's. */
  readonly wrongPassword?: { readonly control: FormControl<string>; readonly words: string };
}

/** What signing in, signing up and joining share: check the fields, send, begin the session, go to the first page. */
@Injectable()
export class EntryForm {
  readonly #sessions = inject(SessionStore);
  readonly #router = inject(Router);
  readonly #injector = inject(Injector);
  readonly #problem = signal<ShownProblem | null>(null);
  readonly #isSending = signal(false);

  readonly problem = this.#problem.asReadonly();
  readonly isSending = this.#isSending.asReadonly();

  /** @returns the problem that the server answered with, or null when there was none or nothing was sent. */
  async submit(entry: Entry): Promise<ApiProblem | null> {
    if (this.#isSending()) return null;
    for (const { control } of entry.fields) control.markAsTouched();
    const unready = entryProblem(entry.fields);
    this.#problem.set(unready);
    if (unready !== null) {
      this.#focusFirstWrong(entry.form);
      return null;
    }
    this.#isSending.set(true);
    try {
      const reply = await firstValueFrom(entry.send());
      this.#sessions.accept(reply);
      await this.#router.navigateByUrl(entry.next ?? landingPath(reply.session?.roles ?? []), {
        replaceUrl: true,
      });
      return null;
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#problem.set(serverProblem(error, entry.fields));
      const { wrongPassword } = entry;
      if (error.slug === 'wrong-credentials' && wrongPassword !== undefined)
        wrongPassword.control.setErrors({ words: wrongPassword.words });
      this.#focusFirstWrong(entry.form);
      return error;
    } finally {
      this.#isSending.set(false);
    }
  }

  /** After the next render, when the fields show what is wrong with them. */
  #focusFirstWrong(form: ElementRef<HTMLElement>): void {
    afterNextRender(
      {
        read: () => {
          form.nativeElement.querySelector<HTMLElement>('input.ng-invalid')?.focus();
        },
      },
      { injector: this.#injector },
    );
  }
}

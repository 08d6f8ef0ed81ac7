import { Location } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import { SessionStore } from '../api/session-store';
import { ProblemNotice } from '../ui/problem-notice';
import { AccountSheet } from './account-sheet';
import { JoinForm } from './join-form';
import { JoinStore } from './join-store';

/** Opens the link that a billing admin handed over: `/join#<secret>`. */
@Component({
  selector: 'kv-join-page',
  imports: [AccountSheet, JoinForm, ProblemNotice, RouterLink],
  templateUrl: './join-page.html',
  providers: [JoinStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JoinPage {
  readonly #location = inject(Location);
  protected readonly store = inject(JoinStore);
  protected readonly person = inject(SessionStore).person;

  constructor() {
    inject(ActivatedRoute)
      .fragment.pipe(
        map((fragment) => fragment ?? ''),
        takeUntilDestroyed(),
      )
      .subscribe((token) => {
        // The secret leaves the address bar and the history as soon as it is read.
        if (token !== '') this.#location.replaceState('/join');
        void this.store.open(token);
      });
  }
}

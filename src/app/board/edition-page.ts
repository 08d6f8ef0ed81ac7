import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { type EditionReply, apiRoutes, mayCall } from '@contract';
import type { ApiProblem } from '../api/api-problem';
import { LineageStore } from '../api/lineage-store';
import { SessionStore } from '../api/session-store';
import { Mark } from '../ui/mark';
import { PageContext } from '../ui/page-context';
import { ProblemNotice } from '../ui/problem-notice';
import { EditionAccess } from './edition-access';
import { editionContext } from './edition-context';
import { EditionExports } from './edition-exports';
import { type EditionFigure, EditionSheet } from './edition-sheet';
import { EditionStore } from './edition-store';
import { EditionTrial } from './edition-trial';
import { EditionVerification } from './edition-verification';
import { stateWords } from './edition-words';
import { ReturnDialog, type ReturnQuestion } from './return-dialog';
import { SignDialog, type SignQuestion } from './sign-dialog';
import { SignatureBlock } from './signature-block';

/** One edition: what do I tell the board? */
@Component({
  selector: 'kv-edition-page',
  imports: [
    EditionAccess,
    EditionExports,
    EditionSheet,
    EditionTrial,
    EditionVerification,
    Mark,
    ProblemNotice,
    RouterLink,
    SignatureBlock,
  ],
  templateUrl: './edition-page.html',
  styleUrl: './edition-page.css',
  providers: [EditionStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionPage {
  readonly #context = inject(PageContext);
  readonly #dialog = inject(MatDialog);
  readonly #lineage = inject(LineageStore);
  readonly #sessions = inject(SessionStore);
  protected readonly store = inject(EditionStore);

  readonly editionId = input.required<string>();

  protected readonly sheet = viewChild(EditionSheet);

  protected readonly stateWords = stateWords;
  protected readonly isTrying = signal(false);
  /** What kept an opened warning from being noted. */
  protected readonly problem = signal<ApiProblem | null>(null);
  protected readonly mayAnswer = computed(() =>
    mayCall(apiRoutes.publishEdition, this.#sessions.roles()),
  );
  readonly #reply = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.reply : null;
  });
  /** The frozen prediction, for those who may read plans, where the edition holds one. */
  protected readonly trialBasis = computed(() => {
    const content = this.#reply()?.content;
    const mayTry = mayCall(apiRoutes.readScenario, this.#sessions.roles());
    return mayTry && content && content.scenarios.length > 0 ? content.fit.prediction : null;
  });

  constructor() {
    effect(() => {
      const id = this.editionId();
      untracked(() => {
        this.isTrying.set(false);
        this.store.load(id);
      });
    });
    effect(() => {
      const reply = this.#reply();
      const roles = this.#sessions.roles();
      if (reply !== null) untracked(() => this.#context.show(editionContext(reply, roles)));
    });
  }

  protected async noteOpened(warningId: string): Promise<void> {
    this.problem.set(await this.store.openWarning(warningId));
  }

  protected openFigure({ key, planned }: EditionFigure): void {
    this.#lineage.open({ editionId: this.editionId() }, key, planned);
  }

  protected print(): void {
    window.print();
  }

  protected askToSign({ edition }: EditionReply, signedNumber: number | null): void {
    const data: SignQuestion = {
      number: edition.number,
      sha256: edition.sha256,
      supersedes: signedNumber,
      sign: (password) => this.store.sign(password),
    };
    this.#dialog.open(SignDialog, dialogOf(data));
  }

  protected askToReturn({ edition }: EditionReply): void {
    const data: ReturnQuestion = {
      number: edition.number,
      publishedBy: edition.publishedBy,
      sendBack: (comment) => this.store.sendBack(comment),
    };
    this.#dialog.open(ReturnDialog, dialogOf(data));
  }
}

function dialogOf<T>(data: T): MatDialogConfig<T> {
  return Object.assign(new MatDialogConfig<T>(), { data, maxWidth: 560 });
}

import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { MatDialogConfig } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import { type FitReply, apiRoutes, mayCall } from '@contract';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { PanelsApi } from '../api/panels-api';
import { SessionStore } from '../api/session-store';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { ProgressLine } from '../ui/progress-line';
import { fitContext } from '../ui/fit-context';
import { FitList } from './fit-list';
import { FitResultView } from './fit-result-view';
import { FitStarter } from './fit-starter';
import { FitStore } from './fit-store';
import { specificationText } from './fit-words';
import { furtherColumns } from './further-columns';
import type { SpecificationDialog, SpecificationQuestion } from './specification-dialog';
import type { Specification } from './specification-form';
import { standingFinding, standingSource } from './standing-words';
import { counted } from '../ui/phrases';

/** Where do we stand, and can I defend it? */
@Component({
  selector: 'kv-fit-page',
  imports: [FitList, FitResultView, MatButton, PageHeader, ProblemNotice, ProgressLine, RouterLink],
  templateUrl: './fit-page.html',
  styleUrl: './fit-home.css',
  providers: [FitStarter, FitStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FitPage {
  readonly #injector = inject(Injector);
  readonly #router = inject(Router);
  readonly #panels = inject(PanelsApi);
  readonly #context = inject(PageContext);
  readonly #numbers = inject(NumberFormat);
  readonly #session = inject(SessionStore);
  protected readonly store = inject(FitStore);
  protected readonly starter = inject(FitStarter);

  readonly fitId = input.required<string>();

  protected readonly mayStart = computed(() => mayCall(apiRoutes.startFit, this.#session.roles()));
  /** Why the panel's columns could not be read for the choice of a specification. */
  protected readonly columnsProblem = signal<ApiProblem | null>(null);
  protected readonly finding = computed(() => {
    const view = this.store.view();
    if (view.kind === 'loading' || view.kind === 'failed') return '';
    const { ownCompany } = view.reply.fit;
    const peers = counted(view.reply.peerGroup.peerCount, 'peer');
    if (view.kind === 'running') return `Fitting ${ownCompany} among ${peers}`;
    if (view.kind === 'done') return standingFinding(view.result, ownCompany, this.#numbers);
    return view.reply.fit.state === 'cancelled'
      ? `The fit of ${ownCompany} among ${peers} was cancelled`
      : `${ownCompany} among ${peers} could not be fitted`;
  });
  protected readonly source = computed(() => {
    const view = this.store.view();
    if (view.kind === 'loading' || view.kind === 'failed') return '';
    return view.kind === 'done'
      ? standingSource(view.result, this.#numbers)
      : specificationText(view.reply.fit);
  });

  constructor() {
    effect(() => {
      const id = this.fitId();
      untracked(() => {
        this.store.show(id);
      });
    });
    effect(() => {
      const view = this.store.view();
      if (view.kind === 'loading' || view.kind === 'failed') return;
      const context = fitContext(view.reply, view.desk, 'en');
      untracked(() => {
        this.#context.show(context);
      });
    });
  }

  /** Asks for another specification and runs it as a fit of its own. */
  protected async changeSpecification(reply: FitReply): Promise<void> {
    const chosen = await this.#ask(specificationOf(reply), reply.panelVersion.id);
    if (chosen === undefined) return;
    const fitId = await this.starter.start({
      ...chosen,
      peerGroupId: reply.fit.peerGroupId,
      furtherRegressors: [...chosen.furtherRegressors],
    });
    if (fitId !== null) await this.#router.navigate(['/fit', fitId]);
  }

  async #ask(
    specification: Specification,
    panelVersionId: string,
  ): Promise<Specification | undefined> {
    this.columnsProblem.set(null);
    try {
      const [{ MatDialog }, dialog, panel] = await Promise.all([
        import('@angular/material/dialog'),
        import('./specification-dialog'),
        firstValueFrom(this.#panels.version(panelVersionId)),
      ]);
      const settings: Pick<
        MatDialogConfig<SpecificationQuestion>,
        'data' | 'maxWidth' | 'autoFocus'
      > = {
        data: { specification, columns: furtherColumns(panel) },
        maxWidth: 640,
        autoFocus: 'first-heading',
      };
      const opened = this.#injector
        .get(MatDialog)
        .open<SpecificationDialog, SpecificationQuestion, Specification>(
          dialog.SpecificationDialog,
          settings,
        );
      return await firstValueFrom(opened.afterClosed(), { defaultValue: undefined });
    } catch (error) {
      this.columnsProblem.set(toApiProblem(error));
      return undefined;
    }
  }
}

/** A fit's specification as its form starts with it. */
function specificationOf({ fit, result }: FitReply): Specification {
  const { effects, form, lag, slopes, confidence, regressors } = fit;
  const seed = result?.specification.seed ?? undefined;
  const furtherRegressors = regressors.slice(2);
  return { effects, form, lag, slopes, seed, confidence, furtherRegressors };
}

import { DOCUMENT } from '@angular/common';
import {
  ApplicationRef,
  ChangeDetectionStrategy,
  Component,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
  viewChildren,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MATERIAL_ANIMATIONS } from '@angular/material/core';
import {
  MatAccordion,
  MatExpansionPanel,
  MatExpansionPanelContent,
  MatExpansionPanelDescription,
  MatExpansionPanelHeader,
  MatExpansionPanelTitle,
} from '@angular/material/expansion';
import { ActivatedRoute, Router, Scroll } from '@angular/router';
import { type FitReply, type FitResult, apiRoutes, mayCall } from '@contract';
import { filter } from 'rxjs';
import { SessionStore } from '../../api/session-store';
import { NumberFormat } from '../../ui/number-format';
import { answersOf } from './answers';
import { companyAddress } from './company-address';
import { DriversBlock } from './drivers-block';
import { EvidenceStore } from './evidence-store';
import { IntervalsBlock } from './intervals-block';
import { ModelsBlock } from './models-block';
import { OneLineBlock } from './one-line-block';
import { OpenQuestions } from './open-questions';
import { questions } from './questions';
import { ResidualsBlock } from './residuals-block';
import { SteadyBlock } from './steady-block';
import { TestsBlock } from './tests-block';
import { TrendsBlock } from './trends-block';

/**
 * The questions that a board and an auditor ask, each folded to its answer in a sentence. An address that ends with the
 * id of a question opens it; on paper all are open.
 */
@Component({
  selector: 'kv-question-panels',
  imports: [
    DriversBlock,
    IntervalsBlock,
    MatAccordion,
    MatExpansionPanel,
    MatExpansionPanelContent,
    MatExpansionPanelDescription,
    MatExpansionPanelHeader,
    MatExpansionPanelTitle,
    ModelsBlock,
    OneLineBlock,
    ResidualsBlock,
    SteadyBlock,
    TestsBlock,
    TrendsBlock,
  ],
  templateUrl: './question-panels.html',
  styleUrl: './question-panels.css',
  // Charts come at once: nothing moves under what a link scrolls to, or while a printer waits.
  providers: [{ provide: MATERIAL_ANIMATIONS, useValue: { animationsDisabled: true } }],
  host: {
    '(window:beforeprint)': 'unfold()',
    '(window:afterprint)': 'isOnPaper.set(false)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuestionPanels {
  readonly #application = inject(ApplicationRef);
  readonly #document = inject(DOCUMENT);
  readonly #injector = inject(Injector);
  readonly #numbers = inject(NumberFormat);
  readonly #open = inject(OpenQuestions);
  readonly #router = inject(Router);
  readonly #session = inject(SessionStore);
  protected readonly store = inject(EvidenceStore);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();

  /** Key of the figure whose lineage is wanted. */
  readonly opened = output<string>();

  private readonly headers = viewChildren(MatExpansionPanelHeader);

  protected readonly ids = questions;
  protected readonly isOnPaper = signal(false);
  readonly #ready = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view : null;
  });
  protected readonly evidence = computed(() => this.#ready()?.evidence ?? null);
  protected readonly bootstrap = computed(() => this.#ready()?.bootstrap ?? null);
  protected readonly mayRun = computed(() =>
    mayCall(apiRoutes.startBootstrap, this.#session.roles()),
  );
  protected readonly asked = computed(() =>
    answersOf(this.result(), this.evidence(), this.#numbers),
  );
  readonly #ids = computed(() => this.asked().map(({ id }) => id));
  protected readonly shown = computed(
    () => new Set(this.#ids().filter((id) => this.isOnPaper() || this.#open.isOpen(id))),
  );
  protected readonly areAllOpen = computed(() => this.#ids().every((id) => this.#open.isOpen(id)));
  readonly #fragment = toSignal(inject(ActivatedRoute).fragment);
  /** The question that the address leads to, once it is asked. */
  readonly #wanted = computed(() => this.#ids().find((id) => id === this.#fragment()));

  /** The router scrolls as well, and lays what it scrolls to under the head of the page: we come after it. */
  readonly #scroll = toSignal(this.#router.events.pipe(filter((event) => event instanceof Scroll)));

  constructor() {
    effect(() => {
      this.#scroll();
      const id = this.#wanted();
      if (id === undefined) return;
      untracked(() => {
        this.#leadTo(id);
      });
    });
  }

  protected openOrCloseAll(): void {
    if (this.areAllOpen()) this.#open.close(...this.#ids());
    else this.#open.open(...this.#ids());
  }

  /** Keeps what a person opened or closed; what paper opens is not kept. */
  protected keep(id: string, isOpen: boolean): void {
    if (this.isOnPaper() || this.#open.isOpen(id) === isOpen) return;
    if (isOpen) this.#open.open(id);
    else this.#open.close(id);
  }

  /** The page is printed as it stands, so all is drawn before that, not with the next rendering. */
  protected unfold(): void {
    this.isOnPaper.set(true);
    this.#application.tick();
  }

  /** Leads to the reasons for a peer, in the peer group that this fit was made with; to the own company's panel row. */
  protected openCompany(company: string): void {
    void this.#router.navigate(...companyAddress(this.reply(), this.result(), company));
  }

  #leadTo(id: string): void {
    this.#open.open(id);
    const place = this.#ids().indexOf(id);
    afterNextRender(
      {
        read: () => {
          this.#document.getElementById(id)?.scrollIntoView();
          this.headers().at(place)?.focus('program', { preventScroll: true });
        },
      },
      { injector: this.#injector },
    );
  }
}

import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { OpenImport, OpenImportsReply } from '@contract';
import { type Observable, firstValueFrom } from 'rxjs';
import { ApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import { Confirm } from '../../ui/confirm';
import { ProblemNotice } from '../../ui/problem-notice';

const shownAtOnce = 3;

const stateWords: Readonly<Record<OpenImport['state'], string>> = {
  mapped: 'Its columns are not checked yet.',
  checked: 'It is checked and not yet a panel version.',
  failed: 'Making it a panel version did not work.',
  committing: 'It is being made a panel version.',
  committed: '',
};

/** The imports of the workspace that somebody began and nobody ended: to go on with, or to discard. */
@Component({
  selector: 'kv-waiting-imports',
  imports: [DatePipe, ProblemNotice, RouterLink],
  templateUrl: './waiting-imports.html',
  styleUrl: './waiting-imports.css',
  host: { '[class.none]': 'isEmpty()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaitingImports {
  readonly #api = inject(PanelsApi);
  readonly #confirm = inject(Confirm);
  readonly #injector = inject(Injector);

  private readonly news = viewChild<ElementRef<HTMLElement>>('news');
  readonly #imports = signal<readonly OpenImport[]>([]);
  readonly #isWhole = signal(false);
  protected readonly problem = signal<ApiProblem | null>(null);
  protected readonly discarded = signal('');
  protected readonly isDiscarding = signal(false);
  protected readonly count = computed(() => this.#imports().length);
  protected readonly shown = computed(() =>
    this.#isWhole() ? this.#imports() : this.#imports().slice(0, shownAtOnce),
  );
  protected readonly hidden = computed(() => this.count() - this.shown().length);
  protected readonly isEmpty = computed(
    () => this.count() === 0 && this.problem() === null && this.discarded() === '',
  );
  protected readonly stateWords = stateWords;

  constructor() {
    void this.read();
  }

  protected async read(): Promise<void> {
    this.problem.set(null);
    await this.#show(this.#api.openImports());
  }

  protected showAll(): void {
    this.#isWhole.set(true);
  }

  protected async discard({ id, fileName }: OpenImport): Promise<void> {
    const isSure = await this.#confirm.ask({
      title: `Discard the import of ${fileName}?`,
      detail: 'The uploaded file goes with it. Panel versions stay as they are.',
      action: 'Discard import',
    });
    if (!isSure || this.isDiscarding()) return;
    this.isDiscarding.set(true);
    this.problem.set(null);
    try {
      await firstValueFrom(this.#api.discard(id), { defaultValue: undefined });
      this.#imports.update((imports) => imports.filter((each) => each.id !== id));
      this.discarded.set(fileName);
      // Its button is gone, and the focus with it.
      afterNextRender(() => this.news()?.nativeElement.focus(), { injector: this.#injector });
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.problem.set(error);
      // Somebody else may have made it a version, or discarded it.
      await this.#show(this.#api.openImports());
    } finally {
      this.isDiscarding.set(false);
    }
  }

  async #show(read: Observable<OpenImportsReply>): Promise<void> {
    try {
      this.#imports.set((await firstValueFrom(read)).imports);
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.problem.set(error);
    }
  }
}

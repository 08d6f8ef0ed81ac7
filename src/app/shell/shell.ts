import { HttpErrorResponse } from '@angular/common/http';
import { DOCUMENT } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  type ElementRef,
  computed,
  effect,
  inject,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router, RouterOutlet } from '@angular/router';
import { type Preferences, maySee, pages } from '@contract';
import { distinctUntilChanged, filter, map, skip } from 'rxjs';
import { LineageStore } from '../api/lineage-store';
import { SessionStore } from '../api/session-store';
import { LineageDrawer } from '../ui/lineage-drawer/lineage-drawer';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { ProblemBannerState } from '../ui/problem';
import { LineageLine } from './lineage-line';
import { ProblemBanner } from './problem-banner';
import { Rail } from './rail';
import { TopBar } from './top-bar';

/** The frame around every page that needs a session. */
@Component({
  selector: 'kv-shell',
  imports: [LineageDrawer, LineageLine, ProblemBanner, Rail, RouterOutlet, TopBar],
  templateUrl: './shell.html',
  styleUrl: './shell.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  readonly #document = inject(DOCUMENT);
  readonly #router = inject(Router);
  readonly #sessions = inject(SessionStore);
  readonly #numbers = inject(NumberFormat);
  readonly #banner = inject(ProblemBannerState);
  protected readonly context = inject(PageContext);
  protected readonly lineage = inject(LineageStore);

  private readonly main = viewChild.required<ElementRef<HTMLElement>>('main');

  protected readonly session = this.#sessions.session;
  protected readonly pages = computed(() =>
    pages.filter((page) => maySee(page, this.#sessions.roles())),
  );

  protected readonly mayOpenPanel = computed(() =>
    this.pages().some((page) => page.path === 'panel'),
  );

  constructor() {
    effect(() => {
      const { theme, unit, negatives } = this.#sessions.preferences();
      this.#numbers.unit.set(unit);
      this.#numbers.negatives.set(negatives);
      const root = this.#document.documentElement;
      if (theme === 'system') root.removeAttribute('data-theme');
      else root.setAttribute('data-theme', theme);
    });
    // A shell that goes away sees no further navigation: its drawer must not wait for the next shell.
    inject(DestroyRef).onDestroy(() => {
      this.lineage.close();
    });
    this.#router.events
      .pipe(
        filter((event) => event instanceof NavigationEnd),
        map((event) => event.urlAfterRedirects.split(/[?#]/)[0]),
        distinctUntilChanged(),
        skip(1),
        takeUntilDestroyed(),
      )
      .subscribe(() => {
        this.#banner.dismiss();
        this.lineage.close();
        this.main().nativeElement.focus({ preventScroll: true });
      });
  }

  /** A page that goes takes its context with it: the next one shows its own, or none. */
  protected leavePage(): void {
    this.context.clear();
  }

  /** Goes on from one figure to one that it was made of. */
  protected openInput(figure: string): void {
    const view = this.lineage.view();
    if (view.kind === 'ready') this.lineage.open(view.source, figure);
  }

  protected async changePreferences(change: Partial<Preferences>): Promise<void> {
    try {
      await this.#sessions.changePreferences(change);
    } catch (error) {
      if (!(error instanceof HttpErrorResponse)) throw error;
      this.#banner.report({
        title: 'Your setting could not be stored',
        whatToDo: 'It is as it was before. Try again in a moment.',
      });
    }
  }

  protected async signOut(): Promise<void> {
    try {
      await this.#sessions.signOut();
    } catch (error) {
      if (!(error instanceof HttpErrorResponse)) throw error;
      this.#banner.report({
        title: 'You are still signed in',
        detail: 'The server did not confirm that you are signed out.',
        whatToDo: 'Try again; on a machine that others use, do not leave before it works.',
      });
      return;
    }
    // A full load drops every store, so that nothing of this person stays in memory.
    this.#document.location.assign('/sign-in');
  }
}

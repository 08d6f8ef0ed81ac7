import { Injectable, effect, inject, signal } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { type RouterStateSnapshot, TitleStrategy } from '@angular/router';
import { SessionStore } from '../api/session-store';
import { PageContext } from '../ui/page-context';

/** `Fit – Velmara – Kinvale`: the route's title, then whose figures they are, or else which workspace. */
@Injectable({ providedIn: 'root' })
export class PageTitle extends TitleStrategy {
  readonly #title = inject(Title);
  readonly #context = inject(PageContext);
  readonly #session = inject(SessionStore);
  readonly #page = signal<string | undefined>(undefined);

  constructor() {
    super();
    effect(() => {
      const whose = this.#context.ownCompany() || this.#session.workspace()?.name;
      const parts = [this.#page(), whose, 'Kinvale'];
      this.#title.setTitle(parts.filter((part) => part !== undefined && part !== '').join(' – '));
    });
  }

  override updateTitle(snapshot: RouterStateSnapshot): void {
    this.#page.set(this.buildTitle(snapshot));
  }
}

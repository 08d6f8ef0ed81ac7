import { DOCUMENT } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterLink } from '@angular/router';

const styles = `
  :host {
    display: grid;
    gap: 16px;
    justify-items: start;
    max-inline-size: 640px;
    padding: 32px;
  }
`;

/** For an address that leads nowhere. */
@Component({
  selector: 'kv-not-found',
  imports: [RouterLink],
  template: `
    <h1>There is no page at this address</h1>
    <p>It may have been deleted, or it belongs to another workspace.</p>
    <p><a routerLink="/">Go to your first page</a></p>
  `,
  styles,
  host: { role: 'main' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}

/** For a page that the person's roles do not open. */
@Component({
  selector: 'kv-not-open',
  imports: [RouterLink],
  template: `
    <h1>Your roles do not open this page</h1>
    <p>A billing admin of your workspace gives roles, on the Members page.</p>
    <p><a routerLink="/">Go to your first page</a></p>
  `,
  styles,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotOpen {}

/** For when not even the session could be read. */
@Component({
  selector: 'kv-unreachable',
  template: `
    <h1>The server gave no answer</h1>
    <p>Nothing is lost: what was saved is saved. Check the connection, then try again.</p>
    <button type="button" class="kv-link" (click)="reload()">Try again</button>
  `,
  styles,
  host: { role: 'main' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Unreachable {
  readonly #document = inject(DOCUMENT);

  protected reload(): void {
    this.#document.location.reload();
  }
}

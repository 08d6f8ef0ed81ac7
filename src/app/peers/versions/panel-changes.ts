import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  effect,
  inject,
  input,
  untracked,
  viewChild,
} from '@angular/core';
import type { PanelVersionSummary } from '@contract';
import { ProblemNotice } from '../../ui/problem-notice';
import { companyChanges } from './change-words';
import { PanelChangesStore } from './panel-changes-store';

/** Says that the saved peers stand on an older panel, and on request what the newer one changed of them. */
@Component({
  selector: 'kv-panel-changes',
  imports: [ProblemNotice],
  template: `
    @let view = store.view();
    <p>
      The saved peers stand on {{ older().panelName }} v{{ older().number }};
      {{ newer().panelName }} v{{ newer().number }} is newer.
      @if (view.kind === 'idle') {
        <button type="button" class="kv-link" (click)="load()">
          See what it changed for these companies
        </button>
      }
    </p>
    <div #outcome tabindex="-1" role="status">
      @if (view.kind === 'loading') {
        <p class="kv-caption">Comparing the two versions…</p>
      }
      @if (found(); as list) {
        @if (list.changes.length === 0) {
          <p>{{ list.isWhole ? 'Nothing changed for these companies.' : nothingListed }}</p>
        } @else {
          <ul>
            @for (change of list.changes; track change.company) {
              <li>{{ change.company }}: {{ change.words }}</li>
            }
          </ul>
          @if (!list.isWhole) {
            <p class="kv-caption">
              There are more differences than are listed: counts can be higher.
            </p>
          }
        }
      }
    </div>
    @if (view.kind === 'failed') {
      <kv-problem-notice [problem]="view.problem.shown" [canRetry]="true" (retried)="load()" />
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
      min-inline-size: 0;
    }
    ul {
      max-block-size: 200px;
      padding-inline-start: 16px;
      overflow-y: auto;
    }
  `,
  providers: [PanelChangesStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelChanges {
  protected readonly store = inject(PanelChangesStore);

  readonly older = input.required<PanelVersionSummary>();
  readonly newer = input.required<PanelVersionSummary>();
  /** The own company and its peers. */
  readonly companies = input.required<readonly string[]>();

  private readonly outcome = viewChild.required<ElementRef<HTMLElement>>('outcome');

  protected readonly nothingListed =
    'Nothing is listed for these companies; there are more differences than are listed.';
  protected readonly found = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? companyChanges(view.differences, this.companies()) : null;
  });

  constructor() {
    effect(() => {
      this.older();
      this.newer();
      untracked(() => {
        this.store.forget();
      });
    });
  }

  /** The button leaves: the focus goes to where the changes will stand. */
  protected load(): void {
    void this.store.load(this.older().id, this.newer().id);
    this.outcome().nativeElement.focus();
  }
}

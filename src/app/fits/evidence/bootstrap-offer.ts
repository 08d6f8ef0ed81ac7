import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Bootstrap } from '@contract';
import { ProgressLine } from '../../ui/progress-line';

/** Draws of the bootstrap, as the engine runs it. */
export const bootstrapDraws = 9999;
const firstSeed = 1;

/** Runs the wild bootstrap beside a fit of many companies, counts its draws, and says what came of it. */
@Component({
  selector: 'kv-bootstrap-offer',
  imports: [ProgressLine],
  template: `
    @if (isUnderWay()) {
      <kv-progress-line
        [phase]="'Wild bootstrap, seed ' + seed() + ', draws'"
        [done]="bootstrap()?.progress?.done"
        [total]="bootstrap()?.progress?.total"
        [canCancel]="mayRun()"
        (cancelled)="cancelled.emit()"
      />
      <p class="kv-caption">You can leave this page: the intervals wait here.</p>
    } @else if (isRun()) {
      <p class="kv-caption">
        Wild bootstrap: {{ draws }} draws with seed {{ seed() }}, kept with this fit.
      </p>
    } @else {
      <p>
        @if (ending(); as words) {
          {{ words }}
        }
        @if (mayRun()) {
          <button type="button" class="kv-link kv-no-print" (click)="started.emit(seed())">
            Run {{ draws }} draws
          </button>
          <span class="kv-caption">&ngsp;of the wild bootstrap, seed {{ seed() }}.</span>
        } @else {
          <span class="kv-caption">
            The wild bootstrap has not been run; an analyst can run its {{ draws }} draws.
          </span>
        }
      </p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BootstrapOffer {
  /** The newest that was asked for. */
  readonly bootstrap = input.required<Bootstrap | null>();
  readonly mayRun = input.required<boolean>();

  /** With the seed to start from. */
  readonly started = output<number>();
  readonly cancelled = output();

  protected readonly draws = bootstrapDraws.toLocaleString('en');
  protected readonly seed = computed(() => this.bootstrap()?.seed ?? firstSeed);
  protected readonly isUnderWay = computed(() => {
    const state = this.bootstrap()?.state;
    return state === 'queued' || state === 'running';
  });
  protected readonly isRun = computed(() => this.bootstrap()?.state === 'done');
  protected readonly ending = computed(() => {
    const bootstrap = this.bootstrap();
    if (bootstrap?.state === 'failed')
      return `It failed: ${bootstrap.failure ?? 'no reason was kept'}`;
    return bootstrap?.state === 'cancelled' ? 'It was cancelled.' : '';
  });
}

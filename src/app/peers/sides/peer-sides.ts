import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  input,
  output,
  viewChild,
  viewChildren,
} from '@angular/core';
import { catchLostFocus } from '../../ui/lost-focus';
import { counted } from '../../ui/phrases';
import { CandidatesStore } from '../candidates/candidates-store';
import { NearnessStore } from '../nearness/nearness-store';
import type { PeersShown } from '../peers-shown';
import { PeersStore } from '../peers-store';
import { PeerTable } from '../table/peer-table';

/** Members and candidates beside each other, and what can be done with all of one side. */
@Component({
  selector: 'kv-peer-sides',
  imports: [PeerTable],
  templateUrl: './peer-sides.html',
  styleUrl: './peer-sides.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeerSides {
  readonly #injector = inject(Injector);
  protected readonly store = inject(PeersStore);
  protected readonly nearness = inject(NearnessStore);
  protected readonly candidates = inject(CandidatesStore);

  readonly page = input.required<PeersShown>();
  readonly isReadOnly = input(false);
  /** Shows what each distance is made of. */
  readonly hasAllParts = input(false);
  readonly moved = output<{ readonly company: string; readonly isIncluded: boolean }>();
  readonly written = output<{
    readonly company: string;
    readonly reason: string;
    readonly isIncluded: boolean;
  }>();
  /** Several companies are to go to one side, or to stay there, with one reason. */
  readonly movedAll = output<{
    readonly companies: readonly string[];
    readonly isIncluded: boolean;
  }>();

  private readonly tables = viewChildren(PeerTable);
  private readonly inHeading = viewChild.required<ElementRef<HTMLElement>>('inHeading');
  private readonly outHeading = viewChild.required<ElementRef<HTMLElement>>('outHeading');

  protected readonly counted = counted;
  /** What leaving each out changes: of the saved choice alone, as long as it is the one on the screen. */
  protected readonly without = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' && !this.store.isChanged() ? view.ground.without : null;
  });
  /** Measures of the model whose values are worth seeing although they do not count. */
  protected readonly otherMeasures = computed(() => {
    const counting = this.nearness.nearness().measures;
    return this.nearness
      .measures()
      .filter((measure) => measure.isOfModel && !counting.includes(measure));
  });
  protected readonly shownCandidates = computed(() =>
    this.candidates.candidates().map(({ name }) => name),
  );
  protected readonly silentMembers = computed(() =>
    this.page()
      .inside.filter(({ reason }) => reason.trim() === '')
      .map(({ company }) => company.name),
  );

  /** Goes to where a company's reason is written; its row where it can only be read. */
  focusReason(company: string): void {
    for (const table of this.tables()) table.focusReason(company);
  }

  /** After several companies went to a side at once: where the button for it is gone, to the head of that side. */
  catchFocus(isIncluded: boolean): void {
    catchLostFocus(
      this.#injector,
      () => (isIncluded ? this.inHeading() : this.outHeading()).nativeElement,
    );
  }

  /** Goes on to the first of the companies that are listed now. */
  protected listAll(): void {
    const known = this.page().outside.length;
    this.candidates.listAll();
    const goOn = (): void => {
      const next = this.page().outside.at(known)?.company.name;
      if (next !== undefined) this.focusReason(next);
    };
    afterNextRender(goOn, { injector: this.#injector });
  }

  protected orderMembers(by: string): void {
    this.candidates.orderMembers(by === 'name' ? 'name' : 'nearness');
  }
}

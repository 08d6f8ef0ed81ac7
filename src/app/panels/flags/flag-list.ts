import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import type { FlagDismissal } from '@contract';
import type { Flag } from '@panel-data';
import { catchLostFocus } from '../../ui/lost-focus';
import { Mark } from '../../ui/mark';
import { NumberFormat } from '../../ui/number-format';
import { counted, yearsText } from '../../ui/phrases';
import type { ShownProblem } from '../../ui/problem';
import { ProblemNotice } from '../../ui/problem-notice';
import type { ShorterCompany } from '../panel-gaps';
import type { SortedFlags } from './dismissed-flags';
import { type FlagGroup, flagGroups } from './flag-groups';
import { flagFigure, flagPlace, flagReason } from './flag-words';

const firstRoom = 8;
const moreRoom = 50;
/** So many flags are all shown at once; of more, each kind is opened by itself. */
const mostOpen = 12;

/** Where a flag stands in the list. */
export interface FlagPlaceInList {
  readonly group: string;
  /** Within its group. */
  readonly at: number;
}

/** What somebody should look at, by kind: each cell with its reason, a way to it, and a way to say that it is right. */
@Component({
  selector: 'kv-flag-list',
  imports: [DatePipe, Mark, ProblemNotice],
  templateUrl: './flag-list.html',
  styleUrl: './flag-list.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FlagList {
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef);
  readonly #injector = inject(Injector);
  protected readonly numbers = inject(NumberFormat);

  /** Null while the panel is looked through. */
  readonly flags = input.required<SortedFlags | null>();
  /** Of the panel's columns. */
  readonly titles = input.required<readonly string[]>();
  /** Companies that enter late or leave early. */
  readonly shorter = input<readonly ShorterCompany[]>([]);
  readonly mayDismiss = input(false);
  /** Whether the flagged value is that of the saved version. */
  readonly isSaved = input<(flag: Flag) => boolean>(() => true);
  /** Why the dismissals could not be read or changed. */
  readonly trouble = input<ShownProblem | null>(null);

  readonly cellWanted = output<Flag>();
  readonly dismissWanted = output<Flag>();
  readonly takeBackWanted = output<FlagDismissal>();
  readonly retried = output();

  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');

  protected readonly count = counted;
  protected readonly years = yearsText;
  protected readonly mostShorter = 60;
  protected readonly dismissedRoom = signal(moreRoom);
  protected readonly groups = computed(() => flagGroups(this.flags()?.open ?? []));
  protected readonly nothing = computed(() =>
    (this.flags()?.dismissed.length ?? 0) === 0
      ? 'Every row has every figure, and none of them stands out.'
      : 'Everything that stood out was looked at.',
  );
  /** What was done last, for the ear. */
  protected readonly said = signal('');
  /** What the person opened or closed, by group. */
  readonly #opened = signal<ReadonlyMap<string, boolean>>(new Map());
  readonly #rooms = signal<ReadonlyMap<string, number>>(new Map());

  protected isShown({ key }: FlagGroup): boolean {
    const isFew = (this.flags()?.open.length ?? 0) <= mostOpen;
    return this.#opened().get(key) ?? (isFew || key === this.groups().at(0)?.key);
  }

  protected toggle(group: FlagGroup): void {
    const isOpen = this.isShown(group);
    this.#opened.update((opened) => new Map(opened).set(group.key, !isOpen));
  }

  protected room({ key }: FlagGroup): number {
    return this.#rooms().get(key) ?? firstRoom;
  }

  protected showMore(group: FlagGroup): void {
    const from = this.room(group);
    this.#rooms.update((rooms) => new Map(rooms).set(group.key, from + moreRoom));
    catchLostFocus(this.#injector, () => this.#line(this.#section(group.key), from));
  }

  protected showMoreDismissed(): void {
    const from = this.dismissedRoom();
    this.dismissedRoom.set(from + moreRoom);
    catchLostFocus(this.#injector, () => this.#line(this.#dismissed(), from));
  }

  placeOf(flag: Flag): FlagPlaceInList {
    const group = this.groups().find(({ flags }) => flags.includes(flag));
    return { group: group?.key ?? '', at: group?.flags.indexOf(flag) ?? 0 };
  }

  /** Says that flags were put aside, and goes on to the one that stands at the place now, or to the next kind. */
  goOnFrom({ group, at }: FlagPlaceInList, count: number): void {
    const left = this.flags()?.open.length ?? 0;
    const rest = left === 0 ? 'Nothing is left to look at.' : `${counted(left, 'flag')} left.`;
    this.said.set(`${counted(count, 'flag')} put aside as right. ${rest}`);
    catchLostFocus(
      this.#injector,
      () =>
        this.#line(this.#section(group), at) ??
        this.#host.nativeElement.querySelector<HTMLElement>('section h3 button') ??
        this.heading().nativeElement,
    );
  }

  /** Says that a flag is to be looked at again, and goes on to the dismissal that stands at the place now. */
  goOnAfterTakingBack(flag: Flag, at: number): void {
    this.said.set(`Taken back: ${this.place(flag)} is to be looked at again.`);
    catchLostFocus(
      this.#injector,
      () => this.#line(this.#dismissed(), at) ?? this.heading().nativeElement,
    );
  }

  #section(key: string): HTMLElement | undefined {
    return [...this.#host.nativeElement.querySelectorAll<HTMLElement>('section')].find(
      ({ dataset }) => dataset['group'] === key,
    );
  }

  #dismissed(): HTMLElement | null {
    return this.#host.nativeElement.querySelector('.dismissed');
  }

  /** The button of the line at the place; of the last one where there are fewer. */
  #line(list: HTMLElement | null | undefined, at: number): HTMLElement | undefined {
    const lines = [...(list?.querySelectorAll<HTMLElement>('li') ?? [])];
    const line = lines.at(Math.min(at, lines.length - 1));
    return line?.querySelector<HTMLElement>('button') ?? undefined;
  }

  protected place(flag: Flag): string {
    return flagPlace(flag, this.titles());
  }

  protected figure(flag: Flag): string {
    return flagFigure(flag, this.numbers);
  }

  protected reason(flag: Flag): string {
    return flagReason(flag, this.numbers);
  }
}

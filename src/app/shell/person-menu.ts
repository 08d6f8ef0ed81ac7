import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import type { Preferences, Role } from '@contract';

const roleWords: Readonly<Record<Role, string>> = {
  analyst: 'analyst',
  cfo: 'CFO',
  reader: 'reader',
  billing_admin: 'billing admin',
};

const themes = ['system', 'light', 'dark'] as const;
const negatives = [
  { value: 'minus', label: '\u22121,234' },
  { value: 'parentheses', label: '(1,234)' },
] as const;

/** Who is signed in, how things are shown to them, and the way out. */
@Component({
  selector: 'kv-person-menu',
  templateUrl: './person-menu.html',
  styleUrl: './person-menu.css',
  host: {
    '(keydown.escape)': 'close()',
    '(focusout)': 'closeWhenLeft($event)',
    '(document:pointerdown)': 'closeWhenOutside($event)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonMenu {
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef);

  readonly name = input.required<string>();
  readonly email = input.required<string>();
  readonly roles = input.required<readonly Role[]>();
  readonly preferences = input.required<Preferences>();

  readonly preferencesChanged = output<Partial<Preferences>>();
  readonly signedOut = output();

  private readonly opener = viewChild.required<ElementRef<HTMLButtonElement>>('opener');

  protected readonly themes = themes;
  protected readonly negatives = negatives;
  protected readonly isOpen = signal(false);
  protected readonly initials = computed(() =>
    this.name()
      .split(/\s+/)
      .filter((word) => word !== '')
      .map((word) => word[0].toUpperCase())
      .filter((_, index, all) => index === 0 || index === all.length - 1)
      .join(''),
  );
  protected readonly roleText = computed(() =>
    this.roles()
      .map((role) => roleWords[role])
      .join(', '),
  );

  protected toggle(): void {
    this.isOpen.update((isOpen) => !isOpen);
  }

  protected close(): void {
    if (!this.isOpen()) return;
    this.isOpen.set(false);
    this.opener().nativeElement.focus();
  }

  protected closeWhenLeft(event: FocusEvent): void {
    const next = event.relatedTarget;
    if (next instanceof Node && !this.#host.nativeElement.contains(next)) this.isOpen.set(false);
  }

  protected closeWhenOutside(event: Event): void {
    if (event.target instanceof Node && !this.#host.nativeElement.contains(event.target))
      this.isOpen.set(false);
  }
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { Logo } from '../ui/logo';

export interface RailPage {
  readonly path: string;
  readonly label: string;
}

const afterTheRule: readonly string[] = ['seats', 'members', 'activity'];

/** The pages in the order of the work: a narrow rail at the left, a bar at the bottom of a phone. */
@Component({
  selector: 'kv-rail',
  imports: [Logo, RouterLink, RouterLinkActive],
  template: `
    <nav aria-label="Pages">
      <a class="home" routerLink="/" aria-label="Kinvale, first page"><kv-logo /></a>
      <ul>
        @for (page of ordered(); track page.path) {
          <li [class.first-after-rule]="page.isFirstAfterRule">
            <a
              [routerLink]="'/' + page.path"
              routerLinkActive="here"
              ariaCurrentWhenActive="page"
              >{{ page.label }}</a
            >
          </li>
        }
      </ul>
    </nav>
  `,
  styleUrl: './rail.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Rail {
  /** Only the pages that the person may see, in the order of the work. */
  readonly pages = input.required<readonly RailPage[]>();

  protected readonly ordered = computed(() => {
    const pages = this.pages();
    const first = pages.findIndex((page) => afterTheRule.includes(page.path));
    return pages.map((page, index) => ({
      ...page,
      isFirstAfterRule: index > 0 && index === first,
    }));
  });
}

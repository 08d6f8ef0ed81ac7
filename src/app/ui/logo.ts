import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The mark and name: one company above a row of its peers. */
@Component({
  selector: 'kv-logo',
  template: `
    <svg viewBox="0 0 32 32" width="28" height="28" aria-hidden="true" focusable="false">
      <path d="M16 3l6 6-6 6-6-6z" fill="var(--kv-copper)" />
      <g fill="none" stroke="var(--kv-slate)" stroke-width="2">
        <circle cx="7" cy="23" r="3.5" />
        <circle cx="16" cy="26" r="3.5" />
        <circle cx="25" cy="23" r="3.5" />
      </g>
    </svg>
    <span class="name">Kinvale</span>
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
    }
    svg {
      margin-inline-start: -2px;
    }
    .name {
      font-weight: 500;
      font-size: 15px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Logo {}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RemarkList } from '../../ui/remark-list';
import type { PanelCompany } from '../peer-draft';
import { groupGuidance } from './group-guidance';

/** Says in words what to mind of the group as it is chosen, or that there is nothing. */
@Component({
  selector: 'kv-group-remarks',
  imports: [RemarkList],
  template: `<div role="status"><kv-remark-list [remarks]="remarks()" /></div>`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GroupRemarks {
  readonly own = input<PanelCompany>();
  /** Those that are in. */
  readonly peers = input.required<readonly PanelCompany[]>();

  protected readonly remarks = computed(() => {
    const own = this.own();
    if (own === undefined || this.peers().length === 0) return [];
    const cautions = groupGuidance(own, this.peers());
    if (cautions.length > 0) return cautions.map((text) => ({ kind: 'caution', text }) as const);
    return [
      {
        kind: 'fine',
        text: `Large and long enough; no company is more than all others together, and ${own.name} is not at an edge of every measure.`,
      } as const,
    ];
  });
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { apiRoutes, mayCall } from '@contract';
import { SessionStore } from '../api/session-store';
import { EmptyState } from '../ui/empty-state';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { FitList } from './fit-list';
import { FitStartStore } from './fit-start-store';
import { FitStarter } from './fit-starter';

import { type Specification, SpecificationForm } from './specification-form';
import { counted, yearsText } from '../ui/phrases';

/** Leads to the newest fit, or offers to run one. */
@Component({
  selector: 'kv-fit-home',
  imports: [
    EmptyState,
    FitList,
    MatButton,
    PageHeader,
    ProblemNotice,
    RouterLink,
    SpecificationForm,
  ],
  templateUrl: './fit-home.html',
  styleUrl: './fit-home.css',
  providers: [FitStartStore, FitStarter],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FitHome {
  readonly #router = inject(Router);
  readonly #context = inject(PageContext);
  readonly #session = inject(SessionStore);
  protected readonly store = inject(FitStartStore);
  protected readonly starter = inject(FitStarter);

  /** The peer group version to fit; the newest where the address names none. */
  readonly peerGroupId = input<string>();

  protected readonly mayStart = computed(() => mayCall(apiRoutes.startFit, this.#session.roles()));
  protected readonly ground = computed(() => {
    const view = this.store.view();
    return view.kind === 'offer' ? view.ground : null;
  });
  protected readonly finding = computed(() => {
    const ground = this.ground();
    if (ground === null) return '';
    const { ownCompany, peerCount } = ground.peerGroup;
    return `Where does ${ownCompany} stand among ${counted(peerCount, 'peer')}?`;
  });
  protected readonly source = computed(() => {
    const ground = this.ground();
    if (ground === null) return '';
    const { panelVersion, peerGroup } = ground;
    return `${panelVersion.panelName} v${panelVersion.number}, ${yearsText(panelVersion.firstYear, panelVersion.lastYear)} · peer group v${peerGroup.number} · not fitted yet`;
  });

  constructor() {
    effect(() => {
      const id = this.peerGroupId();
      untracked(() => void this.store.load(id));
    });
    effect(() => {
      const view = this.store.view();
      untracked(() => {
        if (view.kind === 'found') this.#open(view.fitId);
      });
    });
    effect(() => {
      const ground = this.ground();
      if (ground === null) return;
      const { panelVersion, peerGroup } = ground;
      untracked(() => {
        this.#context.show({
          ownCompany: peerGroup.ownCompany,
          currency: panelVersion.currency,
          unit: panelVersion.unit,
          lineage: [
            {
              label: 'Panel',
              version: `v${panelVersion.number}`,
              detail: yearsText(panelVersion.firstYear, panelVersion.lastYear),
              link: `/panel/${panelVersion.id}`,
            },
            {
              label: 'Peers',
              version: `v${peerGroup.number}`,
              detail: counted(peerGroup.peerCount + 1, 'company', 'companies'),
              link: `/peers/${peerGroup.id}`,
            },
          ],
        });
      });
    });
  }

  protected async start(specification: Specification): Promise<void> {
    const ground = this.ground();
    if (ground === null) return;
    const fitId = await this.starter.start({
      ...specification,
      peerGroupId: ground.peerGroup.id,
      furtherRegressors: [...specification.furtherRegressors],
    });
    if (fitId !== null) this.#open(fitId);
  }

  #open(fitId: string): void {
    void this.#router.navigate(['/fit', fitId], { replaceUrl: true });
  }
}

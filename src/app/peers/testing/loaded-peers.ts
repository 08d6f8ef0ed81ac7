import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { panelVersion } from '../../api/testing/panel-version';
import { NumberFormat } from '../../ui/number-format';
import { CandidatesStore } from '../candidates/candidates-store';
import { NearnessStore } from '../nearness/nearness-store';
import type { PanelCompany } from '../peer-draft';
import { PeersStore } from '../peers-store';

export const flowControl = panelVersion();

/** The stores of the page as they stand once a first choice has loaded: everybody but `outside` is in. */
export async function loadedPeers(
  companies: readonly PanelCompany[],
  ownCompany: string,
  outside: readonly string[],
): Promise<{ readonly peers: PeersStore; readonly candidates: CandidatesStore }> {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([{ path: '**', children: [] }]),
      CandidatesStore,
      NearnessStore,
      PeersStore,
    ],
  });
  const numbers = TestBed.inject(NumberFormat);
  numbers.currency.set('EUR');
  numbers.panelUnit.set('millions');
  const peers = TestBed.inject(PeersStore);
  const http = TestBed.inject(HttpTestingController);
  const loading = peers.load(undefined, true);
  http.expectOne('/api/panel-versions').flush({ versions: [flowControl] });
  http.expectOne('/api/peer-groups').flush({ versions: [] });
  await new Promise((resolve) => setTimeout(resolve));
  http.expectOne(`/api/panel-versions/${flowControl.id}/companies`).flush({ companies });
  await loading;
  peers.chooseOwnCompany(ownCompany);
  peers.changeAll(outside, { isIncluded: false, reason: 'Other cycle', replaces: false });
  return { peers, candidates: TestBed.inject(CandidatesStore) };
}

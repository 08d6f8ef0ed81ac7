import { TestBed } from '@angular/core/testing';
import { type PeerGroupReply, problemType } from '@contract';
import { Confirm } from '../ui/confirm';
import { flowControl } from './testing/loaded-peers';
import { specId } from './testing/peer-version';
import { companies, peersBench, saved } from './testing/peers-bench';

describe('saving a choice of peers', () => {
  const {
    page,
    start,
    settled,
    answer,
    load,
    words,
    writeReason,
    choosePanel,
    press,
    sent,
    drawn,
    server,
  } = peersBench();

  it('sends the choice on top of the version it started from', async () => {
    start(['analyst']);
    await load(saved);
    await press('Take Sarvane out');
    expect(words()).toContain('1 in, 1 out, 1 reason missing.');
    await writeReason('Why Sarvane is out', 'Another business');
    await press('Save peer group');
    const { request, body } = sent();
    expect(body).toEqual({
      panelVersionId: flowControl.id,
      ownCompany: 'Velmara',
      note: '',
      parentId: saved.id,
      peers: [
        { company: 'Kesdrin', isIncluded: true, reason: 'Same customers' },
        { company: 'Sarvane', isIncluded: false, reason: 'Another business' },
      ],
    });
    const next: PeerGroupReply = {
      ...saved,
      id: specId(4),
      number: 2,
      peerCount: 1,
      peers: body.peers,
    };
    request.flush(next);
    await settled();
    await answer('/api/peer-groups', { versions: [next, saved] });
    expect(words()).toContain('Version 2 shown');
    expect(words()).toContain('Version 2 saved.');
    expect(words()).not.toContain('Save peer group');
  });

  it('keeps what was entered when somebody saved meanwhile, and can save it after theirs', async () => {
    start(['analyst']);
    await load(saved);
    await press('Take Sarvane out');
    await press('Save peer group');
    sent().request.flush(
      {
        type: problemType('stale-version'),
        title: 'A newer version exists',
        status: 409,
        detail: 'Sera Quillon saved version 2 of the peer group meanwhile.',
        latestId: specId(5),
      },
      { status: 409, statusText: 'Conflict' },
    );
    await settled();
    expect(words()).toContain('Sera Quillon saved version 2');
    expect(words()).toContain('1 in, 1 out');
    expect(page().querySelector(`a[href="/peers/${specId(5)}"]`)).not.toBeNull();
    await press('Save mine after it');
    const { request, body } = sent();
    expect(body.parentId).toBe(specId(5));
    request.flush(null, { status: 503, statusText: 'Unavailable' });
    await settled();
    expect(words()).toContain('The server does not answer');
    expect(document.activeElement?.textContent).toContain('1 in, 1 out');
    expect(words()).toContain('1 in, 1 out');
  });

  it('keeps what is written while another panel version loads, and follows the last choice', async () => {
    start(['analyst']);
    const newest = { ...flowControl, id: specId(6), number: 3 };
    const second = { ...flowControl, id: specId(7), number: 2 };
    await load(saved, [newest, second]);
    await choosePanel(second.id);
    const overtaken = server().expectOne(`/api/panel-versions/${second.id}/companies`);
    await choosePanel(flowControl.id);
    await writeReason('Why Sarvane is in', 'Same buyers');
    await answer(`/api/panel-versions/${flowControl.id}/companies`, { companies });
    overtaken.flush({ companies: companies.slice(1) });
    await settled();
    expect(words()).toContain('every reason written');
    await press('Save peer group');
    const { request, body } = sent();
    expect(body.panelVersionId).toBe(flowControl.id);
    expect(body.peers).toEqual([
      { company: 'Kesdrin', isIncluded: true, reason: 'Same customers' },
      { company: 'Sarvane', isIncluded: true, reason: 'Same buyers' },
    ]);
    request.flush({ ...saved, id: specId(4), number: 2, peers: body.peers });
    await settled();
    await answer('/api/peer-groups', { versions: [saved] });
  });

  it('keeps what is written while a version is saved, and calls it saved without the list', async () => {
    start(['analyst']);
    await load(saved);
    await press('Take Sarvane out');
    await press('Save peer group');
    const { request, body } = sent();
    await writeReason('Why Sarvane is out', 'Another business');
    request.flush({ ...saved, id: specId(4), number: 2, peerCount: 1, peers: body.peers });
    await settled();
    server()
      .expectOne('/api/peer-groups')
      .flush(null, { status: 503, statusText: 'Service Unavailable' });
    await settled();
    expect(page().querySelector('[role=alert]')).toBeNull();
    expect(words()).toContain('Version 2 shown');
    await press('Save peer group');
    const again = sent();
    expect(again.body.parentId).toBe(specId(4));
    expect(again.body.peers[1].reason).toBe('Another business');
  });

  it('asks before it is left only while something entered is not saved', async () => {
    start(['analyst']);
    await load(saved);
    const ask = spyOn(TestBed.inject(Confirm), 'ask').and.resolveTo(false);
    expect(await drawn().componentInstance.mayLeave()).toBeTrue();
    await press('Take Sarvane out');
    expect(await drawn().componentInstance.mayLeave()).toBeFalse();
    await press('Discard changes');
    expect(await drawn().componentInstance.mayLeave()).toBeTrue();
    expect(ask).toHaveBeenCalledTimes(1);
  });
});

import { peersBench, saved } from './testing/peers-bench';

describe('the Peers page', () => {
  const { page, start, settled, answer, load, words, server } = peersBench();

  it('counts who is in and out, and lists what has no reason', async () => {
    start(['analyst']);
    await load(saved);
    expect(page().querySelector('h1')?.textContent).toContain('Velmara');
    expect(words()).toContain('2 in, 0 out, 1 reason missing.');
    expect(words()).toContain('before each of these has a reason: Sarvane');
    expect(words()).toContain('10 of 11');
  });

  it('asks for an own company before a first version can be saved', async () => {
    start(['analyst']);
    await load(null);
    const save = [...page().querySelectorAll('button')].find((each) =>
      each.textContent?.includes('Save peer group'),
    );
    expect(save?.disabled).toBeTrue();
    const own = [...page().querySelectorAll('select')][1];
    own.value = 'Velmara';
    own.dispatchEvent(new Event('change'));
    await settled();
    expect(save?.disabled).toBeFalse();
    expect(words()).toContain('is compared with all 2 other companies of the panel');
  });

  it('lets a CFO read and change nothing', async () => {
    start(['cfo']);
    await load(saved);
    expect(page().querySelector('textarea')).toBeNull();
    expect(page().querySelector('kv-peer-ground')).toBeNull();
    expect(words()).not.toContain('Take out');
    expect(words()).toContain('No reason written');
  });

  it('offers to bring in a panel where there is none', async () => {
    start(['analyst']);
    server().expectOne('/api/panel-versions').flush({ versions: [] });
    await answer('/api/peer-groups', { versions: [] });
    expect(page().querySelector('a[href="/panel"]')?.textContent).toContain('Bring in a panel');
  });
});

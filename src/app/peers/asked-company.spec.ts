import { companies, peersBench, saved } from './testing/peers-bench';

describe('a company that the address of the Peers page names', () => {
  const { page, start, settled, load, drawn } = peersBench();

  it('goes to the reason of the company that the address names', async () => {
    start(['analyst'], 'Sarvane');
    document.body.append(page());
    await load(saved);
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Why Sarvane is in');
    drawn().componentRef.setInput('company', 'Kesdrin');
    await settled();
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Why Kesdrin is in');
  });

  it('goes to the row of that company where reasons can only be read', async () => {
    start(['cfo'], 'Kesdrin');
    document.body.append(page());
    await load(saved);
    expect(document.activeElement?.textContent).toMatch(/^\s*Kesdrin.*Same customers/s);
  });

  it('stays where it is for a company that is no peer', async () => {
    start(['cfo'], 'Velmara');
    document.body.append(page());
    await load(saved);
    expect(page().contains(document.activeElement)).toBeFalse();
  });

  it('finds the company where the list stops short of it', async () => {
    start(['cfo'], 'Zorvane');
    document.body.append(page());
    const many = Array.from({ length: 240 }, (_, place) => `Peer ${place}`);
    const names = [...many, 'Velmara', 'Zorvane'];
    const listed = names.map((name) => ({ ...companies[0], name }));
    const peers = [...many, 'Zorvane'].map((company) => ({
      company,
      isIncluded: true,
      reason: company,
    }));
    await load({ ...saved, peers, peerCount: peers.length }, [], listed);
    expect(document.activeElement?.textContent).toMatch(/^\s*Zorvane/);
  });
});

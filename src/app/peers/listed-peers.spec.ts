import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import { AskReason } from './reasons/ask-reason';
import { peersBench } from './testing/peers-bench';

describe('members and candidates on the Peers page', () => {
  const { page, start, settled, words, loadMany, listedIn, check, press, sent, reopen } =
    peersBench();

  it('lists members and candidates nearest first, and members by name on request', async () => {
    start(['analyst']);
    await loadMany();
    for (const side of ['in', 'out'] as const) {
      const distances = listedIn(side).map(({ distance }) => distance);
      expect(distances.length).toBeGreaterThan(8);
      expect(distances).toEqual([...distances].sort((a, b) => a - b));
    }
    const order = page().querySelector<HTMLSelectElement>('.order select')!;
    order.value = 'name';
    order.dispatchEvent(new Event('change'));
    await settled();
    expect(listedIn('in')[0].company).toBe('Company 10');
  });

  it('shows what a distance is made of: parts that add up to its square', async () => {
    start(['cfo']);
    await loadMany();
    const [first] = listedIn('out');
    const button = page().querySelector<HTMLElement>(
      '[aria-labelledby="peers-out"] td.distance button',
    );
    button?.click();
    await settled();
    expect(button?.getAttribute('aria-expanded')).toBe('true');
    const lines = [...page().querySelectorAll('kv-distance-parts tbody tr')];
    const parts = lines.map((line) =>
      Number(line.lastElementChild?.textContent.trim().replace('\u2212', '-')),
    );
    expect(lines.length).toBe(6);
    expect(lines.map((line) => line.textContent).join(' ')).toMatch(/growth\s*[\d.]+ % a year/);
    const sum = parts.slice(0, 5).reduce((total, part) => total + part, 0);
    expect(sum).toBeCloseTo(parts[5], 10);
    expect(Math.abs(parts[5] - first.distance ** 2)).toBeLessThan(0.01 * (2 * first.distance + 1));
    await check('Show the parts of every distance');
    expect(page().querySelectorAll('kv-distance-parts').length).toBe(19 - 1);
  });

  it('counts the measures that the analyst chooses, and says why one does not count', async () => {
    start(['analyst']);
    await loadMany();
    const before = listedIn('out');
    await check('volatility');
    expect(listedIn('out')).not.toEqual(before);
    await check('Robust to outliers');
    await check('volatility');
    await check('Usual');
    expect(listedIn('out')).toEqual(before);
    reopen();
    await loadMany(8);
    expect(words()).toContain('does not count: 5 measures need 11 companies');
  });

  it('takes in all candidates that the filters show with one reason, and keeps reasons written', async () => {
    start(['analyst']);
    await loadMany();
    await TestBed.inject(Router).navigate([], { queryParams: { 'with.Industry': 'Pumps' } });
    await settled();
    const shown = listedIn('out').map(({ company }) => company);
    expect(words()).toContain(`${shown.length} of 9 candidates`);
    expect(shown.length).toBeLessThan(9);
    const ask = spyOn(TestBed.inject(AskReason), 'ask').and.resolveTo({
      reason: 'Pumps alike',
      replaces: false,
    });
    await press(`Take all ${shown.length} in with one reason…`);
    expect(ask.calls.mostRecent().args[0].companies).toEqual(shown);
    expect(ask.calls.mostRecent().args[0].reasons).toContain('Same customers');
    expect(words()).toContain(`${10 + shown.length} in, ${9 - shown.length} out`);
    expect(document.activeElement?.id).toBe('peers-in');
    expect(words()).toContain(`${shown.length} companies taken in.`);
    await press('Save peer group');
    const { body } = sent();
    for (const peer of body.peers.filter(({ company }) => shown.includes(company)))
      expect(peer).toEqual({ company: peer.company, isIncluded: true, reason: 'Pumps alike' });
  });

  it('lists the nearest candidates, and more on request or where one of them is asked for', async () => {
    start(['analyst']);
    await loadMany(60);
    const nearest = listedIn('out');
    expect(nearest.length).toBe(20);
    await press('List 9 more');
    const all = listedIn('out');
    expect(document.activeElement?.getAttribute('aria-label')).toBe(
      `Why ${all[20].company} is out`,
    );
    expect(all.slice(0, 20)).toEqual(nearest);
    expect(all.length).toBe(29);
    reopen(all[25].company);
    document.body.append(page());
    await loadMany(60);
    expect(document.activeElement?.getAttribute('aria-label')).toBe(
      `Why ${all[25].company} is out`,
    );
  });

  it('changes nothing where no reason is given for several', async () => {
    start(['analyst']);
    await loadMany();
    spyOn(TestBed.inject(AskReason), 'ask').and.resolveTo(null);
    await press('Leave all 9 out with one reason…');
    expect(words()).toContain('10 in, 9 out, 18 reasons missing.');
  });

  it('goes to what the choice is once the changes are discarded', async () => {
    start(['analyst']);
    await loadMany();
    await press(`Take ${listedIn('out')[0].company} in`);
    expect(words()).toContain('11 in, 8 out');
    await press('Discard changes');
    expect(document.activeElement?.textContent).toContain('10 in, 9 out');
    expect(words()).toContain('The changes are discarded.');
  });
});

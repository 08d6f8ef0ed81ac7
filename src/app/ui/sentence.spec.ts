import { TestBed } from '@angular/core/testing';
import type { SentencePart } from '@figures';
import { NumberFormat } from './number-format';
import { PageContext } from './page-context';
import { Sentence, type SentenceFigureWanted } from './sentence';
import { sentenceRuns } from './sentence-runs';

const setting = { currency: 'EUR', panelUnit: 'millions', unit: 'millions' } as const;
const part = (figure: string | null, value: number): SentencePart => ({
  figure,
  kind: 'money',
  value,
  digits: 0,
  isSize: true,
});
const standing: readonly SentencePart[] = [
  { own: 'Velmara' },
  { text: ' stands ' },
  part('standing', -2407),
  { text: ' (' },
  part('standing', -3539),
  { text: ' to ' },
  part('standing', -1275),
  { text: ') ' },
  { unit: true },
  { text: ' below its peers' },
];

describe('the runs of a sentence', () => {
  it('take a figure and its interval as one', () => {
    expect(sentenceRuns(standing, setting)).toEqual([
      { kind: 'own', text: 'Velmara' },
      { kind: 'words', text: ' stands ' },
      { kind: 'figure', text: '2,407 (3,539 to 1,275)', figure: 'standing', value: -2407 },
      { kind: 'words', text: ' EUR m below its peers' },
    ]);
  });

  it('keep two figures apart, and numbers without a figure among the words', () => {
    const runs = sentenceRuns(
      [part('expected.2026', 10), { text: ' and ' }, part('expected.2027', 20), part(null, 3)],
      setting,
    );
    expect(runs.map(({ kind, text }) => `${kind} ${text}`)).toEqual([
      'figure 10',
      'words  and ',
      'figure 20',
      'words 3',
    ]);
  });

  it('take the words for a missing end with the figure', () => {
    const runs = sentenceRuns([part('drift', 5), { text: ' (no interval) a year' }], setting);
    expect(runs.map(({ text }) => text)).toEqual(['5 (no interval)', ' a year']);
  });
});

describe('a sentence on the screen', () => {
  it('follows the unit, and each of its figures asks for its lineage', async () => {
    TestBed.inject(PageContext).show({ currency: 'EUR', unit: 'millions' });
    TestBed.inject(NumberFormat).unit.set('billions');
    const fixture = TestBed.createComponent(Sentence);
    fixture.componentRef.setInput('sentence', standing);
    const asked: SentenceFigureWanted[] = [];
    fixture.componentInstance.opened.subscribe((wanted) => asked.push(wanted));
    await fixture.whenStable();
    const page = fixture.nativeElement as HTMLElement;
    expect(page.textContent).toBe('Velmara stands 2.407 (3.539 to 1.275) EUR bn below its peers');
    page.querySelector('button')?.click();
    expect(asked.map(({ figure }) => figure)).toEqual(['standing']);
    fixture.componentRef.setInput('isLinked', false);
    await fixture.whenStable();
    expect(page.querySelector('button')).toBeNull();
  });
});

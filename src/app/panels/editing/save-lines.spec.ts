import { SaveCorrections } from '@contract';
import type { PanelRow } from '../panel-rows';
import { cellKey, noEdits, savedRows, setCells } from './panel-edits';
import {
  type SaveDraft,
  draftCorrections,
  emptyDraft,
  groundOf,
  isComplete,
  missingGround,
  saveLines,
} from './save-lines';

const rows: readonly PanelRow[] = [
  { fileRow: 2, company: 'Kesdrin', year: 2020, values: [10, null] },
  { fileRow: 3, company: 'Arvo', year: 2021, values: [11, 5] },
];
const saved = savedRows(rows);
const filled = { company: 'Kesdrin', year: 2020, column: 1 };
const emptied = { company: 'Arvo', year: 2021, column: 0 };
const edits = setCells(noEdits, saved, [
  { place: filled, value: 4 },
  { place: emptied, value: null },
]);
const lines = saveLines(edits, saved, [
  { name: 'mv', role: 'marketValue' },
  { name: 'inv', role: 'capex' },
]);

describe('changes on their way to be saved', () => {
  it('are listed by company and year with what was there before', () => {
    expect(
      lines.map(({ place, title, before, after }) => [place.company, title, before, after]),
    ).toEqual([
      ['Arvo', 'Market value', 11, null],
      ['Kesdrin', 'Capex', null, 4],
    ]);
  });

  it('need a note, a reason each, and a source where a value is given', () => {
    expect(missingGround(emptyDraft, lines)).toEqual({ note: true, reasons: 2, sources: 1 });
    const draft: SaveDraft = {
      note: 'second look',
      common: { reason: 'Misread', source: ' ' },
      own: new Map(),
    };
    expect(missingGround(draft, lines)).toEqual({ note: false, reasons: 0, sources: 1 });
    const whole = { ...draft, own: new Map([[cellKey(filled), { source: 'Report 2020, p. 8' }]]) };
    expect(isComplete(missingGround(whole, lines))).toBeTrue();
  });

  it('take the common reason and source where they have none of their own', () => {
    const draft: SaveDraft = {
      note: 'second look',
      common: { reason: 'Misread', source: 'Report 2021, p. 3' },
      own: new Map([[cellKey(filled), { reason: 'Was missing', source: ' ' }]]),
    };
    expect(groundOf(draft, cellKey(filled))).toEqual({
      reason: 'Was missing',
      source: 'Report 2021, p. 3',
    });
    const body = draftCorrections(edits, draft);
    expect(body.cells.map(({ company, reason }) => [company, reason])).toEqual([
      ['Kesdrin', 'Was missing'],
      ['Arvo', 'Misread'],
    ]);
    expect(SaveCorrections.safeParse(body).success).toBeTrue();
  });
});

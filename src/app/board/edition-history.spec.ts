import { type SignedEdition, historyScales, scaleChanges } from './edition-history';

const edition = (number: number, change: Partial<SignedEdition> = {}): SignedEdition => ({
  id: `00000000-0000-4000-8000-00000000000${number}`,
  number,
  state: 'superseded',
  signedAt: '2026-11-14T09:00:00.000Z',
  signedBy: 'T. Emmerquist',
  ownCompany: 'Velmara',
  currency: 'EUR',
  unit: 'millions',
  form: 'levels',
  confidence: 0.95,
  standing: { estimate: 1800, standardError: 300, low: 1170, high: 2430 },
  rankSet: [1, 2],
  companies: 13,
  lastYear: 2025,
  panelVersionNumber: 4,
  peerGroupNumber: 2,
  ...change,
});
const day = () => '14 Nov 2026';

describe('the history of the standing', () => {
  it('has a row an edition, oldest first, the one that counts now marked', () => {
    const [scale] = historyScales([edition(1), edition(2, { state: 'signed' })], 'millions', day);
    expect(scale.rows).toEqual([
      {
        name: 'Edition 1',
        note: 'signed 14 Nov 2026',
        isMarked: false,
        figure: { estimate: 1800, low: 1170, high: 2430 },
      },
      {
        name: 'Edition 2',
        note: 'signed 14 Nov 2026',
        isMarked: true,
        figure: { estimate: 1800, low: 1170, high: 2430 },
      },
    ]);
  });

  it('converts units of one currency, and keeps currencies and logs on scales of their own', () => {
    const inUnits = edition(1, {
      unit: 'thousands',
      standing: { estimate: 1_500_000, standardError: 1, low: 900_000, high: null },
    });
    const inLogs = edition(3, {
      form: 'log',
      standing: { estimate: Math.log(1.34), standardError: 0.1, low: 0, high: Math.log(1.6) },
    });
    const scales = historyScales(
      [inUnits, edition(2, { currency: 'USD' }), inLogs, edition(4)],
      'millions',
      day,
    );
    expect(scales.map(({ kind, currency }) => `${kind} ${currency}`)).toEqual([
      'money EUR',
      'percent EUR',
      'money USD',
    ]);
    expect(scales[0].rows.map(({ figure }) => figure?.estimate)).toEqual([1500, 1800]);
    expect(scales[0].rows[0].figure?.high).toBeNull();
    expect(scales[1].rows[0].figure?.estimate).toBeCloseTo(0.34, 12);
  });

  it('says why an edition has no mark', () => {
    const [scale] = historyScales([edition(1, { standing: null })], 'millions', day);
    expect(scale.rows[0].figure).toBeNull();
    expect(scale.rows[0].reason).toBe('no standing');
  });

  it('says in words where two editions differ in kind', () => {
    expect(scaleChanges([edition(1), edition(2)])).toEqual([]);
    expect(
      scaleChanges([
        edition(1, { unit: 'thousands' }),
        edition(2),
        edition(3, { currency: 'USD', form: 'log', confidence: 0.9, ownCompany: 'Sarvane' }),
      ]),
    ).toEqual([
      'Edition 2 has its panel in millions, edition 1 in thousands: shown in one unit.',
      'Edition 3 is of Sarvane, edition 2 of Velmara: two companies, not a course.',
      'Edition 3 is in logs, edition 2 in levels: they are not drawn on one scale.',
      'Edition 3 is in USD, edition 2 in EUR: amounts are not converted between currencies.',
      'The intervals of edition 3 are at 90 %, those of edition 2 at 95 %.',
    ]);
  });
});

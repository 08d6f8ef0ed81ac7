import { canonicalFitText } from './canonical-fit-text';
import { selectSample } from './panel/select-sample';
import { fitOf, panelOf, plainSpecification, sha256, type PanelRow } from './testing/golden-panels';

const rows: PanelRow[] = ['B', 'A'].flatMap((company) =>
  Array.from({ length: 3 }, (_, year) => ({
    company,
    year: 2000 + year,
    outcome: year * year + 0.1,
    regressors: [year + company.length],
  })),
);
const names = { outcome: 'y', regressors: ['x'] };

describe('canonicalFitText', () => {
  it('is JSON with sorted keys and shortest numbers, rows by company and year', () => {
    const text = canonicalFitText(
      selectSample(panelOf(rows, names), 'A', undefined),
      plainSpecification,
      'A',
    );
    expect(text).toBe(
      '{"engine":"2.0.0","members":["A","B"],"outcome":"y","own":"A","regressors":["x"],"rows":[["A",2000,0.1,1],["A",2001,1.1,2],["A",2002,4.1,3],["B",2000,0.1,1],["B",2001,1.1,2],["B",2002,4.1,3]],' +
        '"specification":{"confidence":0.95,"effects":"company","form":"levels","lag":0,"seed":null,"slopes":"cr2"}}',
    );
    expect(fitOf(panelOf(rows, names), 'A').hash).toBe(sha256(text));
  });

  it('changes with a cell, a member, the own company and the specification, but not with the file’s lines', () => {
    const data = panelOf(rows, names);
    const hash = fitOf(data, 'A').hash;
    expect(fitOf({ ...data, fileRow: data.fileRow.map((row) => row + 10) }, 'A').hash).toBe(hash);
    const changed = panelOf(
      rows.map((row, index) => (index === 2 ? { ...row, outcome: 4.2 } : row)),
      names,
    );
    const hashes = [
      fitOf(changed, 'A').hash,
      fitOf(data, 'B').hash,
      fitOf(data).hash,
      fitOf(data, 'A', { confidence: 0.9 }).hash,
    ];
    expect(new Set([hash, ...hashes]).size).toBe(5);
  });
});

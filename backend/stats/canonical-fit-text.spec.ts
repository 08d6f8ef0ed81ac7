import { canonicalFitText } from './canonical-fit-text';
import type { Specification } from './fit-result';
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

/** Rows of one company from 2000 on, its own noise in them. */
function years(count: number, company: string): PanelRow[] {
  return Array.from({ length: count }, (_, year) => ({
    company,
    year: 2000 + year,
    outcome: year * year + Math.sin(7 * year + company.charCodeAt(company.length - 1)),
    regressors: [year + Math.cos(year * company.charCodeAt(company.length - 1))],
  }));
}

function canonicalTextOf(
  panelRows: readonly PanelRow[],
  own: string | null,
  specification: Partial<Specification>,
): string {
  const asked = { ...plainSpecification, ...specification };
  const data = panelOf(panelRows, names);
  return canonicalFitText(selectSample(data, own, undefined, asked), {
    data,
    specification: asked,
    own,
  });
}

describe('canonicalFitText', () => {
  it('is JSON with sorted keys and shortest numbers, rows by company and year', () => {
    const text = canonicalTextOf(rows, 'A', {});
    expect(text).toBe(
      '{"engine":"2.2.0","members":["A","B"],"outcome":"y","own":"A","regressors":["x"],"rows":[["A",2000,0.1,1],["A",2001,1.1,2],["A",2002,4.1,3],["B",2000,0.1,1],["B",2001,1.1,2],["B",2002,4.1,3]],' +
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

  it('holds, with a lag, the own company’s last values, which every plan starts from', () => {
    const of = (x: number, own: string | null): string => {
      const changed = rows.map((row) =>
        row.company === 'A' && row.year === 2002 ? { ...row, regressors: [x] } : row,
      );
      return canonicalTextOf(changed, own, { lag: 1 });
    };
    expect(of(3, 'A')).toContain('"engine":"2.2.0","held":[3],"members"');
    expect(of(9, 'A')).not.toBe(of(3, 'A'));
    expect(of(NaN, 'A')).toContain('"held":null,');
    expect(of(9, null)).toBe(of(3, null));
    expect(of(9, 'B')).toBe(of(3, 'B'));
    const hashes = [3, 9].map((x) => {
      const longer = [...years(8, 'A'), ...years(8, 'B')].map((row) =>
        row.company === 'A' && row.year === 2007 ? { ...row, regressors: [x] } : row,
      );
      return fitOf(panelOf(longer, names), 'A', { lag: 1 }).hash;
    });
    expect(new Set(hashes).size).toBe(2);
  });

  it('leaves the seed out where the bootstrap looks at every sign vector', () => {
    const hashes = (companies: number): string[] => {
      const panel = Array.from({ length: companies }, (_, index) =>
        years(6, `C${String(index).padStart(2, '0')}`),
      ).flat();
      return [1, 2].map(
        (seed) => fitOf(panelOf(panel, names), null, { slopes: 'wild', seed }).hash,
      );
    };
    expect(new Set(hashes(12)).size).toBe(1);
    expect(new Set(hashes(13)).size).toBe(2);
  });
});

import type { FlagDismissal } from '@contract';
import type { Flag } from '@panel-data';

const id = (last: number): string => `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a00${10 + last}`;

export const jump: Flag = {
  company: 'Kesdrin',
  year: 2016,
  column: 1,
  value: 4120,
  facts: { code: 'jump', before: 420.4, ratio: 9.8, usualRatio: 1.05, score: 8.1 },
};

export const missing: Flag = {
  company: 'Sarvane',
  year: 2010,
  column: 1,
  value: null,
  facts: { code: 'missing' },
};

export const yearGap: Flag = {
  company: 'Sarvane',
  year: 2012,
  column: null,
  value: null,
  facts: { code: 'year-gap' },
};

export function repeated(company: string, other: string, column = 0): Flag {
  return {
    company,
    year: 2016,
    column,
    value: 812,
    facts: { code: 'duplicate', of: 'figures', company: other, columns: 2, more: 0 },
  };
}

export const sameName: Flag = {
  company: 'NORDWERK',
  year: 2009,
  column: null,
  value: null,
  facts: { code: 'duplicate', of: 'name', company: 'Nordwerk AG', more: 0 },
};

export function slip(year: number, company = 'Velmara'): Flag {
  return {
    company,
    year,
    column: 2,
    value: 450_000,
    facts: {
      code: 'unit-slip',
      factor: 1000,
      isTooLarge: true,
      usual: 450,
      against: 'own-years',
    },
  };
}

export const dismissalOfJump: FlagDismissal = {
  id: id(1),
  company: 'Kesdrin',
  year: 2016,
  column: 1,
  code: 'jump',
  value: 4120,
  reason: 'A new plant, annual report 2016, p. 40',
  at: '2026-03-04T12:00:00.000Z',
  by: 'Ilvo Brenn',
};

export const titles = ['Market value', 'Capex', 'Book equity'];

import { type FileRecipe, numericColumns } from '../file-recipe';
import { textIndices } from './column-indices';
import { type ConvertedPanel, convertPanel } from './conversion/convert-panel';
import { findForeignMarks } from './conversion/foreign-marks';
import type { FindingList } from './finding-list';
import { companyNames } from './mending/company-names';
import { mendTable, type Mended } from './mending/mend-table';
import { type PanelReading, readPanel } from './read-panel';
import type { Table } from './table';

/** The rows that a table becomes, and what they were read from. */
export interface TablePanel extends Omit<PanelReading, 'numbers'>, ConvertedPanel {
  readonly mended: Mended;
}

/** Fiscal years of a panel have four digits. */
const earliestYear = 1000;
/** As renames and corrections allow. */
const longestName = 200;

/**
 * Takes a table through a recipe: mended, read, converted.
 *
 * @throws {TableError} 'missing-column' or 'ambiguous-column' with the headers concerned.
 */
export function panelOfTable(table: Table, recipe: FileRecipe, findings: FindingList): TablePanel {
  const { conversion, mending, reading } = recipe;
  const texts = conversion.currencies === null ? [] : [conversion.currencies.column];
  textIndices(table, [...recipe.attributes, ...texts]);
  const mended = mendTable(table, mending, findings);
  const terms = {
    decimalSign: reading.decimalSign,
    fiscalYears: conversion.fiscalYears,
    companyOf: companyNames(mending.renames),
    earliestYear,
    longestName,
  };
  const { company, year } = recipe;
  const mapping = { company, year, numbers: numericColumns(recipe) };
  const { numbers, ...keys } = readPanel(mended.table, mapping, terms, findings);
  findForeignMarks(mended.table, { ...keys, numbers }, recipe, findings);
  const converted = convertPanel(mended.table, { ...keys, numbers }, recipe, findings);
  return { ...keys, ...converted, mended };
}

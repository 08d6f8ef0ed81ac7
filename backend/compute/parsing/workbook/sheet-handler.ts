import { FileRefusal } from '../file-refusal';
import { type CellContext, cellContent } from './cell-text';
import type { XmlHandler } from './read-xml';
import type { SheetBuilder } from './sheet-builder';
import { unescapeText } from './unescape-text';

/** Reads a sheet's cells into a builder. A formula counts by the value stored beside it and is never evaluated. */
export class SheetHandler implements XmlHandler {
  #line = 0;
  #cells: string[] = [];
  #formulas: number[] = [];
  #numbers: number[] = [];
  #column = -1;
  #type: string | undefined;
  #isDate = false;
  #value = '';
  #hasFormula = false;
  #isInValue = false;
  #isInCell = false;
  #isInPhonetic = false;

  constructor(
    private readonly builder: SheetBuilder,
    private readonly context: CellContext & { readonly dateStyles: ReadonlySet<number> },
  ) {}

  readonly open = (name: string, attributes: Readonly<Record<string, string>>): void => {
    switch (name) {
      case 'row':
        this.#beginRow(attributes['r']);
        break;
      case 'c':
        this.#column = columnOf(attributes['r']) ?? this.#column + 1;
        this.#type = attributes['t'];
        this.#isDate = this.context.dateStyles.has(Number(attributes['s'] ?? 0));
        this.#value = '';
        this.#hasFormula = false;
        this.#isInCell = true;
        break;
      case 'f':
        this.#hasFormula = this.#isInCell;
        break;
      case 'v':
        this.#isInValue = this.#isInCell;
        break;
      case 'rPh':
        this.#isInPhonetic = true;
        break;
      case 't':
        this.#isInValue = this.#isInCell && !this.#isInPhonetic;
        break;
    }
  };

  readonly text = (text: string): void => {
    if (this.#isInValue) this.#value += text;
  };

  readonly close = (name: string): void => {
    switch (name) {
      case 'v':
      case 't':
        this.#isInValue = false;
        break;
      case 'rPh':
        this.#isInPhonetic = false;
        break;
      case 'c':
        this.#endCell();
        break;
      case 'row':
        this.builder.add(this.#line, this.#cells, {
          formulas: this.#formulas,
          numbers: this.#numbers,
        });
        break;
    }
  };

  #beginRow(given: string | undefined): void {
    const line = given === undefined ? this.#line + 1 : Number(given);
    if (!Number.isInteger(line) || line <= this.#line)
      throw new FileRefusal(
        'type_not_allowed',
        `expected a sheet whose rows follow each other; found row ${String(given)} below row ${this.#line}`,
      );
    this.#line = line;
    this.#cells = [];
    this.#formulas = [];
    this.#numbers = [];
    this.#column = -1;
  }

  #endCell(): void {
    this.#isInCell = false;
    const found = cellContent(
      { type: this.#type, value: this.#value, isDate: this.#isDate },
      this.context,
    );
    const text =
      this.#type === 'str' || this.#type === 'inlineStr' ? unescapeText(found.text) : found.text;
    if (text === '' && !this.#hasFormula) return;
    this.builder.checkColumn(this.#column, this.#line);
    while (this.#cells.length < this.#column) this.#cells.push('');
    this.#cells[this.#column] = text;
    if (this.#hasFormula) this.#formulas.push(this.#column);
    if (found.isNumber) this.#numbers.push(this.#column);
  }
}

/** Column of a reference as `AB12`, counted from 0. */
function columnOf(reference: string | undefined): number | undefined {
  if (reference === undefined) return undefined;
  let column = 0;
  for (let index = 0; index < reference.length; index += 1) {
    const code = reference.charCodeAt(index) & ~32;
    if (code < 65 || code > 90) break;
    column = column * 26 + (code - 64);
  }
  return column === 0 ? undefined : column - 1;
}

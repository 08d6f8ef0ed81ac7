import type { ICellEditorComp, ICellEditorParams } from 'ag-grid-community';
import type { PanelRow } from '../panel-rows';

export interface FigureEditorParams {
  /** The cell's figure as it is typed over: every digit, in the unit that is shown. */
  readonly textOf: (row: PanelRow) => string;
  /** What the field is called. */
  readonly label: (row: PanelRow) => string;
}

/** A field in the cell for a figure, as text: what is typed is read when the cell is left. */
export class FigureEditor implements ICellEditorComp<PanelRow, string> {
  readonly #field = document.createElement('input');
  #isTyped = false;
  #before = '';

  init(params: ICellEditorParams<PanelRow, string> & FigureEditorParams): void {
    const { eventKey, data } = params;
    this.#before = params.textOf(data);
    this.#isTyped = eventKey?.length === 1;
    const field = this.#field;
    field.type = 'text';
    field.className = 'kv-figure-editor';
    field.inputMode = 'decimal';
    field.autocomplete = 'off';
    field.value = this.#isTyped && eventKey !== null ? eventKey : this.#before;
    field.setAttribute('aria-label', params.label(data));
  }

  getGui(): HTMLElement {
    return this.#field;
  }

  afterGuiAttached(): void {
    this.#field.focus({ preventScroll: true });
    if (this.#isTyped) this.#field.setSelectionRange(1, 1);
    else this.#field.select();
  }

  getValue(): string {
    return this.#field.value;
  }

  /** Left as it was: nothing is asked to change. */
  isCancelAfterEnd(): boolean {
    return this.#field.value.trim() === this.#before;
  }
}

import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { By } from '@angular/platform-browser';
import { provideRouter } from '@angular/router';
import type { PanelVersionReply, Role } from '@contract';
import { SessionStore } from '../../../api/session-store';
import { PageContext } from '../../../ui/page-context';
import { PanelGrid } from '../../panel-grid';
import type { PanelRow } from '../../panel-rows';
import { PanelDeskGrid } from '../panel-desk-grid';
import { UnsavedEdits } from '../unsaved-edits';
import { id, small } from './desk-panels';

/** The rows of a panel on the desk, in a browser, worked at by mouse and keys. */
export class DeskGridHarness {
  /** Rows as they would be saved, as the desk told them last. */
  edited: readonly PanelRow[] = [];
  savedId: string | undefined;
  /** Whether the page could be left the moment that the saved version was told. */
  mayLeaveOnceSaved: boolean | undefined;

  private constructor(
    readonly fixture: ComponentFixture<PanelDeskGrid>,
    readonly http: HttpTestingController,
  ) {}

  static async open(
    panel: PanelVersionReply = small,
    inputs: Record<string, unknown> = {},
    roles: Role[] = ['analyst'],
  ): Promise<DeskGridHarness> {
    TestBed.resetTestingModule();
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    TestBed.inject(SessionStore).accept({
      session: {
        person: { id: id(8), name: 'Ilvo Brenn', email: 'ilvo@velmara.example' },
        workspace: { id: id(9), name: 'Velmara' },
        roles,
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
    TestBed.inject(PageContext).show({ currency: 'EUR', unit: 'millions', lineage: [] });
    const desk = new DeskGridHarness(
      TestBed.createComponent(PanelDeskGrid),
      TestBed.inject(HttpTestingController),
    );
    await desk.#begin({ panel, versions: [panel.version], mayChange: true, ...inputs });
    return desk;
  }

  /** Nothing is left asked of the server, nor on the page. */
  end(): void {
    this.http.verify();
    this.fixture.destroy();
  }

  async settled(): Promise<void> {
    await this.fixture.whenStable();
    await new Promise((resolve) => setTimeout(resolve, 30));
    await this.fixture.whenStable();
  }

  /** Dialogs open and close in their own time. */
  async until(isSo: () => boolean): Promise<void> {
    for (let times = 0; times < 50 && !isSo(); times++) await this.settled();
    await this.settled();
  }

  async give(inputs: Readonly<Record<string, unknown>>): Promise<void> {
    for (const [name, value] of Object.entries(inputs))
      this.fixture.componentRef.setInput(name, value);
    await this.settled();
    await this.settled();
  }

  get page(): HTMLElement {
    return this.fixture.nativeElement as HTMLElement;
  }

  get words(): string {
    return this.page.textContent.replace(/\s+/g, ' ');
  }

  cell(row: number, column: string): HTMLElement {
    const found = this.page.querySelector<HTMLElement>(
      `.ag-row[row-index="${row}"] .ag-cell[col-id="${column}"]`,
    );
    if (found === null) throw new Error(`expected a cell in row ${row}, column ${column}`);
    return found;
  }

  /** Cells of the block, as `row:column`. */
  get chosen(): readonly string[] {
    return placesOf(this.page.querySelectorAll('.kv-block-cell'));
  }

  /** Cells that assistive technology is told to be selected. */
  get told(): readonly string[] {
    return placesOf(this.page.querySelectorAll('.ag-cell[aria-selected=true]'));
  }

  named(name: string | RegExp, within: ParentNode = this.page): HTMLButtonElement {
    const found = [...within.querySelectorAll<HTMLButtonElement>('button')].find((each) => {
      const text = each.textContent.replace(/\s+/g, ' ').trim();
      return typeof name === 'string' ? text === name : name.test(text);
    });
    if (found === undefined) throw new Error(`expected a button ${String(name)}`);
    return found;
  }

  /** The dialog of a component that is open. */
  dialog(selector: string): HTMLElement {
    const found = document.querySelector<HTMLElement>(selector);
    if (found === null) throw new Error(`expected ${selector}`);
    return found;
  }

  async write(selector: string, text: string, within: ParentNode = document): Promise<void> {
    const field = within.querySelector<HTMLInputElement>(selector);
    if (field === null) throw new Error(`expected ${selector}`);
    field.value = text;
    field.dispatchEvent(new Event('input'));
    await this.settled();
  }

  async click(row: number, column: string, init: MouseEventInit = {}): Promise<void> {
    const at = this.cell(row, column);
    const kinds = { bubbles: true, cancelable: true, pointerType: 'mouse', ...pointer, ...init };
    at.dispatchEvent(new PointerEvent('pointerdown', kinds));
    // As the browser does by itself.
    if (init.shiftKey !== true) at.focus();
    at.dispatchEvent(new PointerEvent('pointerup', kinds));
    for (const kind of ['mouseup', 'click']) at.dispatchEvent(new MouseEvent(kind, kinds));
    await this.settled();
  }

  /** A pointer's way from cell to cell, with whatever is in between; it goes up at the end. */
  async drag(
    pointerType: 'mouse' | 'touch',
    ...cells: readonly (readonly [row: number, column: string])[]
  ): Promise<void> {
    cells.forEach(([row, column], step) => {
      const cell = this.cell(row, column);
      const box = cell.getBoundingClientRect();
      const at = { clientX: box.left + box.width / 2, clientY: box.top + box.height / 2 };
      const init = { bubbles: true, cancelable: true, pointerType, ...pointer, ...at };
      const kind = step === 0 ? 'pointerdown' : 'pointermove';
      cell.dispatchEvent(new PointerEvent(kind, init));
    });
    this.page.dispatchEvent(
      new PointerEvent('pointerup', { bubbles: true, pointerType, ...pointer }),
    );
    await this.settled();
  }

  /** Scrolled to, where the grid has not drawn it. */
  async goTo(row: number, figure: number): Promise<void> {
    const grid = this.fixture.debugElement.query(By.directive(PanelGrid));
    (grid.componentInstance as PanelGrid).goTo({ row, column: figure + 2 });
    await this.settled();
  }

  async press(key: string, init: KeyboardEventInit = {}): Promise<void> {
    const at = document.activeElement ?? document.body;
    at.dispatchEvent(
      new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...init }),
    );
    await this.settled();
  }

  copied(kind: 'copy' | 'cut' = 'copy'): string {
    const clipboardData = new DataTransfer();
    const event = new ClipboardEvent(kind, { clipboardData, bubbles: true, cancelable: true });
    document.activeElement?.dispatchEvent(event);
    return clipboardData.getData('text/plain');
  }

  async paste(text: string): Promise<void> {
    const clipboardData = new DataTransfer();
    clipboardData.setData('text/plain', text);
    document.activeElement?.dispatchEvent(
      new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true }),
    );
    await this.settled();
  }

  /** Into the cell that has the focus. */
  async type(text: string): Promise<void> {
    await this.press('F2');
    const field = document.activeElement as HTMLInputElement;
    field.value = text;
    await this.press('Enter');
  }

  async #begin(inputs: Readonly<Record<string, unknown>>): Promise<void> {
    const { componentInstance } = this.fixture;
    for (const [name, value] of Object.entries(inputs))
      this.fixture.componentRef.setInput(name, value);
    componentInstance.editedChanged.subscribe((rows) => (this.edited = rows));
    componentInstance.saved.subscribe((saved) => {
      this.savedId = saved;
      const leaving = new Event('beforeunload', { cancelable: true });
      TestBed.inject(UnsavedEdits).holdBack(leaving);
      this.mayLeaveOnceSaved = !leaving.defaultPrevented;
    });
    document.body.append(this.page);
    this.fixture.detectChanges();
    await this.settled();
    await this.settled();
  }
}

const pointer = { pointerId: 7, isPrimary: true, buttons: 1 };

function placesOf(cells: Iterable<Element>): readonly string[] {
  return [...cells].map((each) => {
    const row = each.closest('[row-index]')?.getAttribute('row-index') ?? '';
    return `${row}:${each.getAttribute('col-id') ?? ''}`;
  });
}

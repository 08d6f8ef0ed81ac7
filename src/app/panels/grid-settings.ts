import {
  type CellPosition,
  CellStyleModule,
  ClientSideRowModelModule,
  type ColDef,
  CustomEditorModule,
  type Module,
  NumberFilterModule,
  RenderApiModule,
  RowApiModule,
  RowStyleModule,
  ScrollApiModule,
  type TabToNextCellParams,
  TextFilterModule,
  themeQuartz,
} from 'ag-grid-community';
import type { PanelRow } from './panel-rows';

/** What the panel's grid uses, and no more: the rest of the grid's code is not loaded. */
export const gridModules: readonly Module[] = [
  CellStyleModule,
  ClientSideRowModelModule,
  CustomEditorModule,
  NumberFilterModule,
  RenderApiModule,
  RowApiModule,
  RowStyleModule,
  ScrollApiModule,
  TextFilterModule,
];

export const gridRowHeight = 32;
export const gridHeadHeight = 40;

export const gridOverlays = {
  noRows: { overlayText: 'No row fits what is chosen above' },
  noMatchingRows: { overlayText: 'No row fits the filters' },
};

/** What all columns share. */
export const gridColumn: ColDef<PanelRow> = {
  sortable: true,
  resizable: true,
  flex: 1,
  minWidth: 128,
};

/** Tab leaves the grid, as in any grid of the page; while a cell is edited it goes on to the next one. */
export function tabToNextCell({
  editing,
  nextCellPosition,
}: TabToNextCellParams<PanelRow>): CellPosition | boolean {
  return editing ? (nextCellPosition ?? true) : false;
}

/** The grid on our paper: every colour is a token, so that light and dark follow by themselves. */
export const gridTheme = themeQuartz.withParams({
  accentColor: 'var(--kv-spruce)',
  backgroundColor: 'var(--kv-paper)',
  foregroundColor: 'var(--kv-ink)',
  textColor: 'var(--kv-ink)',
  subtleTextColor: 'var(--kv-soft-ink)',
  headerBackgroundColor: 'var(--kv-sunken)',
  headerTextColor: 'var(--kv-ink)',
  headerFontWeight: 500,
  chromeBackgroundColor: 'var(--kv-sunken)',
  menuBackgroundColor: 'var(--kv-raised)',
  inputBackgroundColor: 'var(--kv-paper)',
  inputTextColor: 'var(--kv-ink)',
  inputPlaceholderTextColor: 'var(--kv-soft-ink)',
  inputBorder: 'solid 1px var(--kv-edge)',
  borderColor: 'var(--kv-hairline)',
  rowHoverColor: 'var(--kv-sunken)',
  menuShadow: 'none',
  menuBorder: 'solid 1px var(--kv-edge)',
  wrapperBorderRadius: '4px',
  borderRadius: '4px',
  browserColorScheme: 'inherit',
  fontFamily: 'var(--kv-words)',
  cellFontFamily: 'var(--kv-words)',
  fontSize: '13px',
  headerFontSize: '12px',
  rowHeight: `${gridRowHeight}px`,
  headerHeight: `${gridHeadHeight}px`,
  iconSize: '16px',
});

'use client';

import type {
  CellFocusedEvent,
  ColDef,
  ColGroupDef,
  GridApi,
  RowClassRules,
} from 'ag-grid-community';
import {
  CellApiModule,
  CellStyleModule,
  ClientSideRowModelApiModule,
  ClientSideRowModelModule,
  ColumnApiModule,
  ModuleRegistry,
  RenderApiModule,
  RowApiModule,
  RowStyleModule,
  ScrollApiModule,
  TooltipModule,
  themeQuartz,
} from 'ag-grid-community';
import { AgGridReact } from 'ag-grid-react';
import { useCallback, useEffect, useMemo, useRef } from 'react';

ModuleRegistry.registerModules([
  CellApiModule,
  CellStyleModule,
  ClientSideRowModelApiModule,
  ClientSideRowModelModule,
  ColumnApiModule,
  RenderApiModule,
  RowApiModule,
  RowStyleModule,
  ScrollApiModule,
  TooltipModule,
]);

const theme = themeQuartz.withParams({
  fontFamily: 'inherit',
  fontSize: 13,
  headerFontSize: 12,
  headerFontWeight: 600,
  foregroundColor: 'var(--ink)',
  headerTextColor: 'var(--ink-soft)',
  backgroundColor: 'var(--paper)',
  chromeBackgroundColor: 'var(--paper)',
  headerBackgroundColor: 'var(--paper)',
  oddRowBackgroundColor: 'transparent',
  rowHoverColor: 'transparent',
  borderColor: 'var(--cured)',
  accentColor: 'var(--carbon)',
  wrapperBorder: false,
  wrapperBorderRadius: 0,
  borderRadius: 0,
  rowHeight: 36,
  headerHeight: 30,
  cellHorizontalPadding: 6,
  spacing: 6,
  columnBorder: false,
});

export interface LedgerGridProps<Row> {
  /** What the grid lists, for screen readers. */
  label: string;
  rows: readonly Row[];
  columns: (ColDef<Row> | ColGroupDef<Row>)[];
  keyOf: (row: Row) => string;
  /** Class names of rows, each with the rows that have it. */
  rowClasses: RowClassRules<Row>;
  selectedKey: string | null;
  onSelect: (key: string) => void;
  /** Told the keys in the order in which they are shown, whenever it changes. */
  onOrder: (keys: readonly string[]) => void;
  noRows: string;
}

/**
 * The one set-up of the grid: rows that are walked with the arrow keys, the focused row being the
 * chosen one. It scrolls inside itself and takes the height that it is given.
 */
export function LedgerGrid<Row>(props: LedgerGridProps<Row>) {
  const { label, rows, columns, keyOf, rowClasses, selectedKey, onSelect, onOrder, noRows } = props;
  const api = useRef<GridApi<Row> | null>(null);
  const selected = useRef(selectedKey);
  selected.current = selectedKey;

  const reportOrder = useCallback(() => {
    const keys: string[] = [];
    api.current?.forEachNodeAfterFilterAndSort((node) => {
      if (node.data) keys.push(keyOf(node.data));
    });
    onOrder(keys);
  }, [keyOf, onOrder]);

  const focused = useCallback(
    (event: CellFocusedEvent<Row>) => {
      if (event.rowIndex === null || event.rowPinned) return;
      const row = event.api.getDisplayedRowAtIndex(event.rowIndex)?.data;
      if (row && keyOf(row) !== selected.current) onSelect(keyOf(row));
    },
    [keyOf, onSelect],
  );

  const showChosen = useCallback(() => {
    const grid = api.current;
    if (!grid || selected.current === null) return;
    const index = grid.getRowNode(selected.current)?.rowIndex;
    if (index === null || index === undefined) return;
    const at = grid.getFocusedCell();
    if (at?.rowIndex === index) return;
    grid.ensureIndexVisible(index);
    const column = at?.column ?? grid.getAllDisplayedColumns()[0];
    if (column) grid.setFocusedCell(index, column);
  }, []);

  // biome-ignore lint/correctness/useExhaustiveDependencies: a newly chosen row is what to follow
  useEffect(showChosen, [selectedKey, showChosen]);

  const defaultColumn = useMemo<ColDef<Row>>(
    () => ({
      resizable: false,
      suppressMovable: true,
      suppressHeaderMenuButton: true,
      sortable: true,
    }),
    [],
  );
  return (
    <section aria-label={label} className="ledger h-full min-h-0 w-full">
      <AgGridReact<Row>
        theme={theme}
        themeCssLayer="grid"
        themeStyleContainer={() => document.body}
        rowData={rows as Row[]}
        columnDefs={columns}
        defaultColDef={defaultColumn}
        getRowId={({ data }) => keyOf(data)}
        rowClassRules={rowClasses}
        ensureDomOrder
        suppressColumnVirtualisation
        alwaysShowVerticalScroll
        animateRows={false}
        tooltipShowDelay={500}
        overlayNoRowsTemplate={`<span>${noRows}</span>`}
        onGridReady={(event) => {
          api.current = event.api;
        }}
        onModelUpdated={reportOrder}
        onFirstDataRendered={showChosen}
        onCellFocused={focused}
      />
    </section>
  );
}

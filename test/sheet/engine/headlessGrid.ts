import { LocaleType, LogLevel, Univer } from '@univerjs/core';
import { FUniver } from '@univerjs/core/facade';
import { UniverFormulaEnginePlugin } from '@univerjs/engine-formula';
import { UniverSheetsPlugin } from '@univerjs/sheets';
import { UniverSheetsFormulaPlugin } from '@univerjs/sheets-formula';
import { UniverSheetsNumfmtPlugin } from '@univerjs/sheets-numfmt';
import '@univerjs/engine-formula/facade';
import '@univerjs/sheets/facade';
import '@univerjs/sheets-formula/facade';
import '@univerjs/sheets-numfmt/facade';
import type { DemoSheet } from '../demo/demoSheet.ts';
import { workbookData } from '../demo/workbookData.ts';
import type { Picture } from '../grid/grid.ts';
import { UniverGrid } from './univerGrid.ts';

export interface HeadlessGrid {
  readonly grid: UniverGrid;
  /** What would float over the cells, by sheet id and picture id. */
  readonly pictures: ReadonlyMap<string, Picture>;
  dispose(): void;
}

/** The engine keeps parsed formulas by workbook id for the whole process: each workbook needs an id of its own. */
let opened = 0;

/** Makes a workbook without a screen: of these sheets, or of one empty sheet of that name. */
export function createHeadlessGrid(contents: string | readonly DemoSheet[]): HeadlessGrid {
  const univer = new Univer({ locale: LocaleType.EN_US, locales: {}, logLevel: LogLevel.SILENT });
  univer.registerPlugin(UniverFormulaEnginePlugin);
  univer.registerPlugin(UniverSheetsPlugin);
  univer.registerPlugin(UniverSheetsFormulaPlugin);
  univer.registerPlugin(UniverSheetsNumfmtPlugin);
  const api = FUniver.newAPI(univer);
  const id = `book-${++opened}`;
  const book = api.createWorkbook(
    typeof contents === 'string'
      ? {
          id,
          sheetOrder: ['sheet-1'],
          sheets: { 'sheet-1': { id: 'sheet-1', name: contents, rowCount: 2000, columnCount: 60 } },
        }
      : workbookData(id, contents),
  );
  const pictures = new Map<string, Picture>();
  const layer = {
    show: (sheet: string, id: string, picture: Picture) => void pictures.set(`${sheet}/${id}`, picture),
    hide: (sheet: string, id: string) => void pictures.delete(`${sheet}/${id}`),
  };
  const grid = new UniverGrid(api, book, univer.__getInjector(), layer);
  if (typeof contents !== 'string') grid.recalculate();
  return { grid, pictures, dispose: () => univer.dispose() };
}

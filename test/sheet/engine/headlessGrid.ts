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

/** Makes an empty workbook of one sheet, without a screen. */
export function createHeadlessGrid(sheetName: string): HeadlessGrid {
  const univer = new Univer({ locale: LocaleType.EN_US, locales: {}, logLevel: LogLevel.SILENT });
  univer.registerPlugin(UniverFormulaEnginePlugin);
  univer.registerPlugin(UniverSheetsPlugin);
  univer.registerPlugin(UniverSheetsFormulaPlugin);
  univer.registerPlugin(UniverSheetsNumfmtPlugin);
  const api = FUniver.newAPI(univer);
  const book = api.createWorkbook({
    id: `book-${++opened}`,
    sheetOrder: ['sheet-1'],
    sheets: { 'sheet-1': { id: 'sheet-1', name: sheetName, rowCount: 2000, columnCount: 60 } },
  });
  const pictures = new Map<string, Picture>();
  const layer = {
    show: (sheet: string, id: string, picture: Picture) => void pictures.set(`${sheet}/${id}`, picture),
    hide: (sheet: string, id: string) => void pictures.delete(`${sheet}/${id}`),
  };
  const grid = new UniverGrid(api, book, univer.__getInjector(), layer);
  return { grid, pictures, dispose: () => univer.dispose() };
}

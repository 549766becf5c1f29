import { LocaleType, LogLevel, mergeLocales, Univer } from '@univerjs/core';
import { FUniver } from '@univerjs/core/facade';
import { UniverSheetsCorePreset } from '@univerjs/preset-sheets-core';
import coreWords from '@univerjs/preset-sheets-core/locales/en-US';
import { UniverSheetsDrawingPreset } from '@univerjs/preset-sheets-drawing';
import drawingWords from '@univerjs/preset-sheets-drawing/locales/en-US';
import '@univerjs/preset-sheets-core/lib/index.css';
import '@univerjs/preset-sheets-drawing/lib/index.css';
import type { DemoSheet } from '../demo/demoSheet.ts';
import { workbookData } from '../demo/workbookData.ts';
import { UniverGrid } from '../engine/univerGrid.ts';
import { FloatingPictures } from './floatingPictures.ts';

export interface PageSheet {
  readonly grid: UniverGrid;
  readonly api: FUniver;
}

/** Opens a workbook in an element of the page: cells, formula bar and sheet tabs, no ribbon. */
export function createSheet(container: string, sheets: readonly DemoSheet[]): PageSheet {
  const univer = new Univer({
    locale: LocaleType.EN_US,
    locales: { [LocaleType.EN_US]: mergeLocales(coreWords, drawingWords) },
    logLevel: LogLevel.ERROR,
  });
  const presets = [
    UniverSheetsCorePreset({
      container,
      header: true,
      toolbar: false,
      formulaBar: true,
      footer: { statisticBar: false, zoomSlider: false, menus: false, sheetBar: true },
    }),
    UniverSheetsDrawingPreset(),
  ];
  for (const { plugins } of presets) {
    for (const plugin of plugins) {
      if (Array.isArray(plugin)) univer.registerPlugin(plugin[0], plugin[1]);
      else univer.registerPlugin(plugin);
    }
  }
  const api = FUniver.newAPI(univer);
  const book = api.createWorkbook(workbookData('demo', sheets));
  const grid = new UniverGrid(api, book, univer.__getInjector(), new FloatingPictures(api, book));
  return { grid, api };
}

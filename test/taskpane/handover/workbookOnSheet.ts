import { join } from 'node:path';
import { runInNewContext } from 'node:vm';
import { buildSync } from 'esbuild';
import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { compileLaw } from '../../../core/law/compileLaw.ts';
import { excelWorkbook } from '../../../taskpane/host/excelWorkbook.ts';
import type { Choice } from '../../../taskpane/state/choice.ts';
import { settingsFor } from '../../../taskpane/state/settingsFor.ts';
import { readingsIn, readSheetCells } from '../../../taskpane/state/sheetCells.ts';
import { chlorine } from '../../sheet/demo/chlorine.ts';
import type { FunctionsScript } from '../../sheet/functionsScript.ts';
import { type HeadlessSheet, openSheet } from '../../sheet/headless.ts';
import { root } from '../../sheet/root.ts';

let script: FunctionsScript | undefined;

/** The sheet functions of these sources. */
function functionsOfSources(): FunctionsScript {
  const bundle = (entry: string, globalName?: string): string => {
    const { outputFiles } = buildSync({
      entryPoints: [join(root, 'functions', entry)],
      bundle: true,
      write: false,
      format: 'iife',
      target: 'es2022',
      logLevel: 'error',
      ...(globalName === undefined ? {} : { globalName }),
    });
    return outputFiles[0]?.text ?? '';
  };
  if (script === undefined) {
    const ask = "\nJSON.stringify(metadata.functionsMetadata('https://host.invalid'))";
    const metadata: unknown = runInNewContext(bundle('metadata.ts', 'metadata') + ask);
    // Written by functionsMetadata.
    script = {
      text: bundle('main.ts'),
      metadata: JSON.parse(String(metadata)) as FunctionsScript['metadata'],
    };
  }
  return script;
}

/** Opens the demo's bottle test with the add-in in it, as the panel's host. */
export async function openDemo(): Promise<HeadlessSheet> {
  const sheet = await openSheet({ workbook: [chlorine], functions: functionsOfSources() });
  Object.assign(globalThis, { Excel: Reflect.get(sheet.host, 'Excel') });
  await sheet.settle();
  return sheet;
}

/** The demo's bottle test as a choice of the panel. */
export const bottleTest: Choice = {
  x: { sheet: 'Chlorine', address: 'A6:A40' },
  y: { sheet: 'Chlorine', address: 'B6:B40' },
  xHeading: { name: 'time', unit: 'h' },
  yHeading: { name: 'C', unit: 'mg/L' },
  law: 'first order',
  ownLaws: [],
  known: [],
  spreadY: { kind: 'text', text: '' },
  spreadX: { kind: 'text', text: '' },
  options: new Map(),
  leftOut: [],
  units: new Map([['k', '1/h']]),
};

/** The fit of a choice with the cells as they are now. */
export async function fitOf(choice: Choice): Promise<Fit> {
  const cells = await readSheetCells(excelWorkbook, choice);
  const { readings } = readingsIn(cells, []);
  const { constants } = compileLaw(
    choice.law,
    choice.known.map(({ name }) => name),
  );
  return fitLaw(readings, choice.law, settingsFor(choice, constants, cells, readings.count));
}

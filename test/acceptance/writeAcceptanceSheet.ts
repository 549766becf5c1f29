import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { packageVersion } from '../../manifest-template/buildAll.ts';
import { root } from '../sheet/root.ts';
import { acceptancePage } from './acceptancePage.ts';
import { acceptanceCsv, sheetRows } from './acceptanceSheet.ts';
import { checkComputer } from './computeCheck.ts';

/**
 * Writes acceptance.csv and acceptance.html beside the functions.js that computes their values.
 *
 * @param folder holds a built functions.js
 */
export async function writeAcceptanceSheet(folder: string): Promise<void> {
  const rows = sheetRows(checkComputer(readFileSync(join(folder, 'functions.js'), 'utf8')));
  writeFileSync(join(folder, 'acceptance.csv'), acceptanceCsv(rows));
  writeFileSync(join(folder, 'acceptance.html'), acceptancePage(rows, packageVersion(root)));
}

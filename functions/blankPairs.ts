import type { Call } from './call.ts';
import { readingsOf } from './fitting.ts';
import { showsBlanks } from './fromHost.ts';

/** The host refuses to hand over much more in one request. */
const MOST_CELLS = 50_000;

/** Whether some zero among a call's readings could be a blank cell: a (0, 0), or a y of 0 after the last non-zero one. */
export function hasDoubtfulZero(call: Call): boolean {
  const { readings } = readingsOf(call);
  if (readings.trailingZeros > 0) return true;
  for (let i = 0; i < readings.x.length; i++) {
    if (readings.x[i] === 0 && readings.y[i] === 0) {
      return !showsBlanks(call.range('x')) && !showsBlanks(call.range('y'));
    }
  }
  return false;
}

/**
 * Asks the host which pairs have a blank cell.
 * @param addresses of x and y, with their sheets
 * @param count number of pairs
 * @returns 1 for every pair with a blank cell, or undefined where the host cannot be asked; `CHECKS` then says what
 *   was taken for blank
 */
export async function askBlankPairs(
  addresses: readonly [string | undefined, string | undefined],
  count: number,
): Promise<Uint8Array | undefined> {
  const [addressX, addressY] = addresses.map(splitAddress);
  if (
    addressX === undefined ||
    addressY === undefined ||
    count > MOST_CELLS ||
    typeof Excel === 'undefined'
  ) {
    return undefined;
  }
  try {
    return await Excel.run(async (context) => {
      const ranges = [addressX, addressY].map(({ sheet, cells }) => {
        const range = context.workbook.worksheets.getItem(sheet).getRange(cells);
        range.load('valueTypes');
        return range;
      });
      await context.sync();
      const [typesX = [], typesY = []] = ranges.map((range) => range.valueTypes.flat());
      if (typesX.length !== count || typesY.length !== count) return undefined;
      return Uint8Array.from(typesX, (type, index) =>
        type === 'Empty' || typesY[index] === 'Empty' ? 1 : 0,
      );
    });
  } catch {
    // The host would not say, a protected or closed workbook perhaps: the readings then state what was assumed.
    return undefined;
  }
}

/** `'My sheet'!A2:A9` as the sheet's name and the cells; undefined for anything that is not one area of a sheet. */
function splitAddress(address: string | undefined): { sheet: string; cells: string } | undefined {
  const mark = address?.lastIndexOf('!') ?? -1;
  if (address === undefined || mark < 1 || address.includes(',')) return undefined;
  const sheet = address
    .slice(0, mark)
    .replace(/^'(.*)'$/, '$1')
    .replaceAll("''", "'");
  return { sheet: sheet.replace(/^\[[^\]]*\]/, ''), cells: address.slice(mark + 1) };
}

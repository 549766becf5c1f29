import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { expectDigits } from '../../expectDigits.ts';
import type { HeadlessSheet } from '../../sheet/headless.ts';
import { catalogueCases, ownCases, roughCases } from './cases.ts';
import { plainWorkbook, type WorkingsCase, workingsOnSheet } from './workingsOnSheet.ts';

function nameOf({ law, known, uY, uX, options }: WorkingsCase): string {
  const more = [known, Array.isArray(uY) ? 'u_y by reading' : uY && `u_y ${uY}`, uX && `u_x ${uX}`, options];
  return [law, ...more.filter(Boolean)].join(', ');
}

const cases = [...catalogueCases, ...ownCases, ...roughCases].map((one) => [nameOf(one), one] as const);

describe('workings in plain formulas, calculated by a spreadsheet engine without the add-in', () => {
  let sheet: HeadlessSheet;
  beforeAll(async () => {
    sheet = await plainWorkbook();
  });
  afterAll(() => sheet?.close());

  test.each(cases)('%s', async (_, one) => {
    const { fit, compared, verdict } = await workingsOnSheet(sheet, one);
    const short = compared.filter(({ digits }) => !(typeof digits === 'number' && digits >= 10));
    expect(short).toEqual([]);
    // Every constant that the fit settles is among them.
    const labels = new Set(compared.map(({ label }) => label));
    for (const { name, value } of fit.constants) if (Number.isFinite(value)) expect(labels).toContain(name);
    expect(verdict).toMatch(/^The workings and the live function agree to 1[0-5] digits\.$/);
  });

  test('stand on their own where the add-in is gone', async () => {
    const [one] = catalogueCases.filter(({ law }) => law === 'first order');
    if (one === undefined) throw new Error('the case is gone');
    const { fit, compared, verdict } = await workingsOnSheet(sheet, one, 'absent');
    expect(verdict).toMatch(/^The add-in is not here, so there is nothing to compare with/);
    expect(new Set(compared.map(({ text }) => text))).toEqual(
      new Set(['the add-in is not here: nothing to compare with']),
    );
    const cells = sheet.block('Workings!A1:B120');
    const k = cells.find(([label]) => label === 'k')?.[1];
    expectDigits(Number(k), fit.constants.find(({ name }) => name === 'k')?.value ?? 0, 14);
  });
});

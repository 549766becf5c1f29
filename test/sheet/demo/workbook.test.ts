import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { rectOf } from '../grid/address.ts';
import { type HeadlessSheet, openSheet } from '../headless.ts';
import { demoWorkbook } from './workbook.ts';

describe('the demo workbook, without functions', () => {
  let sheet: HeadlessSheet;
  beforeAll(async () => {
    sheet = await openSheet({ workbook: demoWorkbook, functions: null });
    await sheet.settle();
  });
  afterAll(() => sheet?.close());

  test.each(demoWorkbook.map((demo) => [demo.name, demo] as const))(
    '%s is laid out to be typed into',
    (name, demo) => {
      const on = (address: string) => `'${name}'!${address}`;
      const { typed, x, y } = demo.followed;
      const headers = sheet.block(on('A5:B5')).flat();
      for (const header of headers) expect(header).toMatch(/^\S.* \/ \S+/);

      const xs = sheet.block(on(x)).flat();
      const ys = sheet.block(on(y)).flat();
      expect(ys).toHaveLength(xs.length);
      expect(ys.filter((value) => typeof value === 'number').length).toBeGreaterThanOrEqual(10);
      expect(ys.filter((value) => typeof value === 'string')).toHaveLength(1);
      // The formulas refer to more rows than are filled.
      expect(ys.at(-1)).toBeNull();
      expect(rectOf(typed).bottom).toBeLessThan(rectOf(y).bottom);
      // Below what is typed there is nothing yet.
      expect(ys.slice(rectOf(typed).bottom - rectOf(typed).top + 1).every((value) => value === null)).toBe(
        true,
      );

      const formulas = Object.values(demo.blocks)
        .flat(2)
        .filter((cell) => String(cell).startsWith('=TAUT.'));
      expect(formulas.length).toBeGreaterThanOrEqual(3);
    },
  );

  test('kelvins follow the degrees that are typed', async () => {
    expect(sheet.get("'Cold room'!B6")).toBeCloseTo(250.65, 10);
    expect(sheet.get("'Cold room'!B20")).toBe('');
    sheet.set("'Cold room'!A20", 12);
    await sheet.settle();
    expect(sheet.get("'Cold room'!B20")).toBeCloseTo(285.15, 10);
  });
});

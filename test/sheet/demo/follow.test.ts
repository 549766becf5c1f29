import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { rectOf } from '../grid/address.ts';
import { type HeadlessSheet, openSheet } from '../headless.ts';
import { chlorine } from './chlorine.ts';
import { type FollowedStep, follow } from './follow.ts';
import { demoWorkbook } from './workbook.ts';

describe('the demo workbook with the built functions', () => {
  let sheet: HeadlessSheet;
  beforeAll(async () => {
    sheet = await openSheet({ workbook: demoWorkbook });
    await sheet.settle();
  });
  afterAll(() => sheet?.close());

  test('no cell shows an error, and every formula has room to spill', () => {
    const errors: string[] = [];
    for (const { id, name } of sheet.grid.sheets()) {
      const used = sheet.grid.usedRect(id);
      if (!used) continue;
      for (let row = used.top; row <= used.bottom; row++) {
        for (let column = used.left; column <= used.right; column++) {
          const { value } = sheet.grid.read(id, row, column);
          if (typeof value === 'object' && value !== null) {
            errors.push(`${name} row ${row + 1} column ${column + 1}: ${value.error} ${value.message ?? ''}`);
          }
        }
      }
    }
    expect(errors).toEqual([]);
  });

  test('typed one by one, the chlorine readings settle on the constant they were made with', async () => {
    const steps: FollowedStep[] = [];
    for await (const step of follow(sheet, chlorine)) steps.push(step);
    const { top, bottom } = rectOf(chlorine.followed.typed);
    expect(steps).toHaveLength(bottom - top + 1);
    expect(steps[0]?.constants).toEqual([]);
    expect(steps[0]?.reason).toMatch(/2/);
    const k = steps.at(-1)?.constants.find((one) => one.name === 'k');
    // 0.094 per hour went into the readings; the rest is their scatter.
    expect(Math.abs(Number(k?.value) - 0.094)).toBeLessThan(3 * Number(k?.uncertainty));
    expect(steps.at(-1)?.ranking[0]?.law).toBe('exponential');
  });
});

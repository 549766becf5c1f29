import { beforeAll, describe, expect, test } from '@jest/globals';
import { bundleScript } from '../../manifest-template/bundleScripts.ts';
import { expectDigits } from '../expectDigits.ts';
import { root } from '../sheet/root.ts';
import { acceptanceChecks } from './acceptanceChecks.ts';
import { acceptancePage } from './acceptancePage.ts';
import { acceptanceCsv, FIRST_ROW, formulaOf, type SheetRow, sheetRows } from './acceptanceSheet.ts';
import { checkComputer } from './computeCheck.ts';

let rows: SheetRow[];

beforeAll(async () => {
  const { text } = await bundleScript(root, 'functions/main.ts');
  rows = sheetRows(checkComputer(text));
}, 60_000);

const label = (check: (typeof acceptanceChecks)[number]) =>
  [`${check.what}: ${formulaOf(check)}`, check] as const;

describe('the acceptance sheet', () => {
  test.each(acceptanceChecks.filter(({ published }) => published).map(label))(
    '%s as published',
    (_label, check) => {
      const { value, digits } = check.published ?? { value: Number.NaN, digits: 0 };
      expectDigits(Number(rows.find((row) => row.check === check)?.expected), value, digits);
    },
  );

  test.each(acceptanceChecks.filter(({ fixed }) => fixed).map(label))(
    '%s as the contract says',
    (_label, check) => {
      expect(rows.find((row) => row.check === check)?.expected).toBe(check.fixed);
    },
  );

  test('of eight rows in the bottle test seven hold numbers and one a word; four more are blank', () => {
    const shown = (what: string) => rows.find(({ check }) => check.what.startsWith(what))?.expected;
    expect(shown('readings used')).toBe(7);
    expect(shown('readings set aside')).toBe(1);
  });

  test('every value is a number or a text that a cell can show', () => {
    expect(rows).toHaveLength(acceptanceChecks.length);
    for (const { expected } of rows) {
      if (typeof expected === 'number') expect(Number.isFinite(expected)).toBe(true);
      else expect(expected).not.toBe('');
    }
  });

  test('formulas name the cells that hold their readings', () => {
    const formulas = rows.map(({ formula }) => formula);
    expect(formulas).toContain('=INDEX(TAUT.LINE($A$5:$A$40,$B$5:$B$40,"straight line"),2,2)');
    expect(formulas).toContain('=TAUT.CONSTANT($C$5:$C$12,$D$5:$D$12,"power","q")');
    expect(formulas).toContain('=TAUT.CONSTANT($G$5:$G$16,$H$5:$H$16,"C(t) = C0*exp(-k*t)","k","u",,"2%")');
    const lines = acceptanceCsv(rows).split('\r\n');
    expect(lines[FIRST_ROW - 1]?.startsWith('0.2,0.1,0.38709927,0.2408467,1.309,2.138,0,1.02,,')).toBe(true);
    expect(lines[FIRST_ROW + 34]?.startsWith('0.5,0.2,,,,,,,')).toBe(true);
  });

  test('the file has one verdict a check, and quotes what needs quotes', () => {
    const csv = acceptanceCsv(rows);
    expect(csv.match(/""agrees"",""differs""/g)).toHaveLength(rows.length);
    expect(csv).toContain('"=INDEX(TAUT.LINE($A$5:$A$40,$B$5:$B$40,""straight line""),2,2)"');
  });

  test('the page lists every formula with its value', () => {
    const page = acceptancePage(rows, '1.0.0');
    expect(page.match(/<tr><td>/g)).toHaveLength(rows.length);
    expect(page).toContain('certified values, NIST StRD Norris');
    expect(page).not.toContain('<script');
  });
});

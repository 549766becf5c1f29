import { beforeAll, describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { type LoadedFunctions, loadFunctions } from './loadFunctions.ts';

let functions: LoadedFunctions;
beforeAll(() => {
  functions = loadFunctions();
});

const column = (...cells: unknown[]): unknown[][] => cells.map((cell) => [cell]);
const hours = column(1, 2, 3, 4, 5, 6, 7, 8);
/** Close to 2 + 3 x, with a scatter that no law follows exactly. */
const wear = column(5.1, 7.9, 11.2, 13.8, 17.1, 19.9, 23.2, 25.8);
const rowsOf = (value: unknown): unknown[][] => {
  if (!Array.isArray(value)) throw new Error(`no table: ${String(value)}`);
  return value;
};
const header = (value: unknown): unknown[] | undefined => rowsOf(value)[0];
const firstColumn = (value: unknown): unknown[] => rowsOf(value).map(([first]) => first);

describe('tables of the contract', () => {
  test('LINE', () => {
    const table = rowsOf(functions.call('LINE', hours, wear, 'straight line', null, null, null, null));
    expect(table[0]).toEqual(['term', 'value', 'standard uncertainty']);
    expect(firstColumn(table)).toEqual(['term', 'slope', 'intercept', 'correlation']);
    expect(table[3]?.[2]).toBe('');
    // Sums by hand: Σ(x − x̄)(y − ȳ) = 125.4, Σ(x − x̄)² = 42.
    expect(table[1]?.[1]).toBeCloseTo(125.4 / 42, 12);
    expect(table[2]?.[1]).toBeCloseTo(15.5 - (125.4 / 42) * 4.5, 12);
  });

  test('CONSTANTS, and CONSTANT part by part', () => {
    const table = rowsOf(functions.call('CONSTANTS', hours, wear, 'straight line'));
    expect(table[0]).toEqual(['constant', 'value', 'standard uncertainty', 'low', 'high']);
    expect(firstColumn(table)).toEqual(['constant', 'a', 'b']);
    const b = table[2] ?? [];
    for (const [part, index] of [
      [null, 1],
      ['Value', 1],
      ['u', 2],
      ['low', 3],
      ['HIGH', 4],
    ] as const) {
      expect(functions.call('CONSTANT', hours, wear, 'straight line', 'b', part)).toBe(b[index]);
    }
  });

  test('STRAIGHTNESS', () => {
    const table = rowsOf(functions.call('STRAIGHTNESS', hours, wear, 'straight line'));
    expect(firstColumn(table)).toEqual([
      'readings used',
      'readings set aside',
      'degrees of freedom',
      'r squared',
      'residual standard deviation',
      'bow %',
      'bow p',
      'runs p',
      'misfit',
      'leave-one-out misfit',
      'log-likelihood',
      'AICc',
      'chi-squared p',
    ]);
    expect(table.slice(0, 3).map(([, value]) => value)).toEqual([8, 0, 6]);
    expect(table[12]?.[1]).toBe('');
  });

  test('COMPARE', () => {
    const table = rowsOf(functions.call('COMPARE', hours, wear, 'straight line; power; exponential'));
    expect(table[0]).toEqual(['rank', 'law', 'support %', 'AICc', 'r squared', 'bow %', 'misfit', 'reason']);
    expect(table[1]?.slice(0, 2)).toEqual([1, 'straight line']);
    expect(table).toHaveLength(4);
    expect(
      functions.call('COMPARE', hours, wear, column('straight line', null, 'power', 'exponential')),
    ).toEqual(table);
    expect(rowsOf(functions.call('COMPARE', hours, wear))).toHaveLength(12);
  });

  test.each(['AXES', 'RESIDUALS'])('%s has a row for every pair of cells, in place', (id) => {
    const y = column(5.1, 'lost', 11.2, null, 17.1, 19.9, 23.2, 25.8);
    const table = rowsOf(functions.call(id, hours, y, 'straight line'));
    expect(table).toHaveLength(9);
    expect(header(table)).toEqual(
      id === 'AXES'
        ? ['x', 'y', 'fitted', 'residual']
        : ['reading', 'residual', 'standardised', 'leverage', 'influence', 'finding'],
    );
    const numbers = table.slice(1).map((row) => typeof row[1] === 'number');
    expect(numbers).toEqual([true, false, true, false, true, true, true, true]);
  });

  test.each(['Y.AT', 'X.AT'])('%s has a row for every cell of at, and no header', (id) => {
    const table = rowsOf(functions.call(id, hours, wear, 'straight line', [[10, '', 12]]));
    expect(table.map((row) => row.length)).toEqual([4, 4, 4]);
    expect(table[1]).toEqual(['', '', '', '']);
    expect(table.flat().filter((cell) => typeof cell === 'number')).toHaveLength(8);
  });

  test('CHECKS', () => {
    const table = rowsOf(functions.call('CHECKS', hours, wear, 'straight line'));
    expect(header(table)).toEqual(['level', 'finding']);
    for (const [level, finding] of table.slice(1)) {
      expect(['stop', 'caution', 'note']).toContain(level);
      expect(String(finding)).toMatch(/\.$/);
    }
  });

  test('CHECKS says why a fit stops, and what was set aside', () => {
    const table = rowsOf(functions.call('CHECKS', column(1, 2, 3), column(1, '<0.5', null), 'straight line'));
    expect(table[1]?.[0]).toBe('stop');
    expect(table[2]).toEqual(['caution', expect.stringContaining('Reading 2')]);
    const domain = rowsOf(functions.call('CHECKS', hours, column(1, 2, -3, 4, 5, 6, 7, 8), 'power'));
    expect(domain[1]).toEqual(['stop', expect.stringMatching(/reading 3/i)]);
  });

  test('STATEMENT is one sentence', () => {
    const sentence = functions.call('STATEMENT', hours, wear, 'straight line', 'b', 'mm/h');
    expect(sentence).toEqual(expect.stringContaining('mm/h'));
  });

  test('STRAIGHTEN and LAWS', () => {
    const forms = rowsOf(functions.call('STRAIGHTEN', 'C(t) = C0*exp(-k*t)'));
    expect(forms[0]).toEqual(['form', 'plot', 'against', 'slope', 'intercept', 'trial', 'note']);
    expect(forms[1]?.slice(0, 3)).toEqual([1, 'ln C', 't']);
    const laws = rowsOf(functions.call('LAWS'));
    expect(laws[0]).toEqual(['law', 'equation', 'plot', 'against', 'slope', 'intercept', 'use']);
    expect(firstColumn(laws)).toEqual(expect.arrayContaining(['straight line', 'saturation', 'basquin']));
    expect(laws).toHaveLength(28);
  });

  test('EACH and SHARE', () => {
    const keys = column('a', 'a', 'a', 'a', 'b', 'b', 'b', 'b');
    const each = rowsOf(functions.call('EACH', keys, hours, wear, 'straight line'));
    expect(each[0]).toEqual(['key', 'readings', 'a', 'u(a)', 'b', 'u(b)', 'r squared', 'bow %', 'note']);
    expect(each.slice(1).map(([key, readings]) => [key, readings])).toEqual([
      ['a', 4],
      ['b', 4],
    ]);
    const share = rowsOf(functions.call('SHARE', keys, hours, wear, 'straight line'));
    expect(share[0]).toEqual(['term', 'value', 'standard uncertainty', 'note']);
    expect(firstColumn(share).slice(1, 4)).toEqual(['shared slope', 'F', 'p']);
    expect(functions.refusal('EACH', column('a'), hours, wear, 'straight line').message).toMatch(/key.*1.*8/);
  });

  test('NEXT', () => {
    const table = rowsOf(functions.call('NEXT', hours, wear, 'straight line', 'b', 0, 20));
    expect(table[0]).toEqual(['next x', 'u now', 'u after']);
    const [at, now, after] = table[1] ?? [];
    // The far end of the range is where a reading tells most about a slope.
    expect(at).toBe(20);
    expect(Number(after)).toBeLessThan(Number(now));
  });
});

describe('refusals', () => {
  test.each<[string, unknown[], string, RegExp]>([
    ['an unknown law', [hours, wear, 'no such law'], '#VALUE!', /law/],
    ['no law', [hours, wear, null], '#VALUE!', /law must be.*missing/],
    ['sizes that differ', [hours, column(1, 2), 'power'], '#VALUE!', /x has 8 and y has 2/],
    ['a bad option', [hours, wear, 'power', null, null, null, 'fit=magic'], '#VALUE!', /line or direct/],
    ['a bad known', [hours, wear, 'power', 'p=x'], '#VALUE!', /value of p/],
    ['u_x without u_y', [hours, wear, 'power', null, null, 0.1], '#VALUE!', /u_x must/],
    ['a bad u_y', [hours, wear, 'power', null, -1], '#VALUE!', /u_y must be above 0/],
    ['one reading', [column(1), column(2), 'straight line'], '#N/A', /1 reading/],
    ['a zero where ln is taken', [hours, column(1, 2, -3, 4, 5, 6, 7, 8), 'power'], '#N/A', /reading 3/i],
    ['no spread in x', [column(2, 2, 2), column(1, 2, 3), 'straight line'], '#N/A', /x/],
    ['a product that cannot be taken apart', [hours, wear, 'y = a*b*x'], '#VALUE!', /a.*b/],
  ])('%s', (_what, given, code, message) => {
    const error = functions.refusal('CONSTANTS', ...given);
    expect(error.code).toBe(code);
    expect(error.message).toMatch(message);
  });

  test('an error in a cell or an argument is handed on', () => {
    const y = column(1, functions.error('#DIV/0!'), 3);
    expect(functions.refusal('LINE', column(1, 2, 3), y, 'straight line').code).toBe('#DIV/0!');
    expect(functions.refusal('LINE', hours, wear, functions.error('#NUM!')).code).toBe('#NUM!');
    const waiting = column(5.1, functions.error('#N/A'), 11.2, 13.8);
    expect(rowsOf(functions.call('LINE', column(1, 2, 3, 4), waiting, 'straight line'))).toHaveLength(4);
  });

  test('CONSTANT names what it can give', () => {
    expect(functions.refusal('CONSTANT', hours, wear, 'straight line', 'B').message).toMatch(/a or b.*'B'/);
    expect(functions.refusal('CONSTANT', hours, wear, 'straight line', 'b', 'upper').message).toMatch(
      /low or high/,
    );
  });

  test('wrong arguments of CHECKS stay errors', () => {
    expect(functions.refusal('CHECKS', hours, wear, 'no such law').code).toBe('#VALUE!');
  });

  test('text in at is refused by position', () => {
    expect(functions.refusal('Y.AT', hours, wear, 'straight line', [[1, 'two']]).message).toMatch(/cell 2/);
  });
});

describe('two readings', () => {
  test('give values and no uncertainties', () => {
    const table = rowsOf(functions.call('CONSTANTS', column(1, 2), column(3, 5), 'straight line'));
    expect(table.slice(1).map((row) => row.slice(2))).toEqual([
      ['', '', ''],
      ['', '', ''],
    ]);
    expect(table[2]?.[1]).toBeCloseTo(2, 12);
    expect(functions.call('CONSTANT', column(1, 2), column(3, 5), 'straight line', 'b', 'u')).toBe('');
  });
});

describe('blank cells', () => {
  const filled = (blank: unknown): [unknown[][], unknown[][]] => [
    [...hours, [blank], [blank]],
    [...wear, [blank], [blank]],
  ];

  test('as null or as 0, a blank tail changes nothing', () => {
    const plain = functions.call('CONSTANTS', hours, wear, 'straight line');
    for (const blank of [null, 0]) {
      expect(functions.call('CONSTANTS', ...filled(blank), 'straight line')).toEqual(plain);
    }
  });

  test('CHECKS says when zeros were taken for blanks', () => {
    const texts = (blank: unknown) =>
      JSON.stringify(functions.call('CHECKS', ...filled(blank), 'straight line'));
    expect(texts(0)).toMatch(/2 pairs with y = 0 were taken as blank/);
    expect(texts(null)).not.toMatch(/taken as blank/);
  });

  test('a zero is a reading where the host shows blanks', () => {
    const x = column(1, 2, 3, 4, null);
    const y = column(3, 2, 1, 0, null);
    const table = rowsOf(functions.call('STRAIGHTNESS', x, y, 'straight line'));
    expect(table[0]?.[1]).toBe(4);
  });

  test('the host is asked which zeros are blanks, where it can be', async () => {
    const page = loadFunctions();
    const types: Record<string, string[][]> = {
      A1: [['Double'], ['Double'], ['Double'], ['Double'], ['Empty']],
      B1: [['Double'], ['Double'], ['Double'], ['Double'], ['Empty']],
    };
    const asked: string[] = [];
    const range = (cells: string) => ({
      load: (what: string) => asked.push(`${cells} ${what}`),
      valueTypes: types[cells.slice(0, 2)],
    });
    page.setGlobal('Excel', {
      run: (job: (context: unknown) => unknown) =>
        job({
          sync: () => Promise.resolve(),
          workbook: { worksheets: { getItem: (_sheet: string) => ({ getRange: range }) } },
        }),
    });
    const x = column(1, 2, 3, 4, 0);
    const y = column(3, 2, 1, 0, 0);
    const addresses = ["'Pump 3'!A1:A5", "'Pump 3'!B1:B5"];
    const result = page.callFrom(addresses, 'STRAIGHTNESS', x, y, 'straight line');
    expect(rowsOf(await result)[0]?.[1]).toBe(4);
    expect(asked).toEqual(['A1:A5 valueTypes', 'B1:B5 valueTypes']);
    // Without a doubtful zero there is nothing to ask, and the answer comes at once.
    expect(rowsOf(page.callFrom(addresses, 'STRAIGHTNESS', hours, wear, 'straight line'))).toHaveLength(13);
    expect(asked).toHaveLength(2);
  });

  test('a host that will not say leaves the tail of zeros out', async () => {
    const page = loadFunctions();
    page.setGlobal('Excel', { run: () => Promise.reject(new Error('busy')) });
    const y = column(3.1, 2, 1, 0, 0);
    const result = page.callFrom(
      ['S!A1:A5', 'S!B1:B5'],
      'STRAIGHTNESS',
      column(1, 2, 3, 4, 0),
      y,
      'straight line',
    );
    expect(rowsOf(await result)[0]?.[1]).toBe(3);
  });
});

test('whatever stands in the cells, every answer is legal cells or an error, and the cells stay as they are', () => {
  const cell = fc.oneof(
    { weight: 6, arbitrary: fc.double({ min: -1e3, max: 1e3, noNaN: true }) },
    { weight: 1, arbitrary: fc.double({ noNaN: true, noDefaultInfinity: true }) },
    { weight: 1, arbitrary: fc.constantFrom<unknown>(null, '', '<1', 'text', true, 0, '1e5') },
  );
  const readings = fc.array(fc.tuple(cell, cell), { minLength: 1, maxLength: 12 });
  const law = fc.constantFrom(
    'straight line',
    'power',
    'exponential',
    'reciprocal',
    'proportional',
    'y = a +',
    '',
  );
  const own: Readonly<Record<string, unknown[]>> = {
    CONSTANT: ['b', null],
    'Y.AT': [[[1], [0], [null]]],
    'X.AT': [[[1], [0], [null]]],
    STATEMENT: ['b', 'm'],
    NEXT: ['b', 0, 10],
  };
  const legal = (value: unknown): boolean =>
    (typeof value === 'number' && Number.isFinite(value)) ||
    typeof value === 'string' ||
    typeof value === 'boolean' ||
    functions.isError(value);
  fc.assert(
    fc.property(readings, law, fc.constantFrom(...functions.ids), (pairs, text, id) => {
      const x = pairs.map(([first]) => [first]);
      const y = pairs.map(([, second]) => [second]);
      const keys = pairs.map((_pair, index) => [index % 2]);
      const given =
        id === 'LAWS'
          ? []
          : id === 'STRAIGHTEN'
            ? [text, null]
            : [...(id === 'EACH' || id === 'SHARE' ? [keys] : []), x, y, text, ...(own[id] ?? [])];
      const before = JSON.stringify(given);
      let result: unknown;
      try {
        result = functions.call(id, ...given);
      } catch (error) {
        if (!functions.isError(error)) throw error;
        result = error;
        expect(error.message).not.toMatch(/fault of its own/);
      }
      const cells: unknown[] = Array.isArray(result) ? result.flat() : [result];
      expect(cells.every(legal)).toBe(true);
      if (Array.isArray(result)) expect(new Set(rowsOf(result).map((row) => row.length)).size).toBe(1);
      expect(JSON.stringify(given)).toBe(before);
    }),
    { seed: 20260302, numRuns: 300 },
  );
});

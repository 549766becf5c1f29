import type { DataName } from './acceptanceData.ts';

/** An argument of a formula: cells of the sheet, or a value typed into the formula. */
export type Argument =
  | { readonly cells: DataName; readonly column: 'x' | 'y'; readonly first?: number }
  | string
  | number;

/** One formula of the sheet and what is known about its value beforehand. */
export interface AcceptanceCheck {
  readonly what: string;
  readonly id: string;
  readonly arguments: readonly Argument[];
  /** 1-based row and column of the one cell to look at, where the function returns a table. */
  readonly cell?: readonly [row: number, column: number];
  /** The value in print, and how many digits of it the sum must reach. */
  readonly published?: { readonly value: number; readonly digits: number; readonly source: string };
  /** The answer that the contract fixes. */
  readonly fixed?: string;
}

const NORRIS = 'certified values, NIST StRD Norris';
const R = 'R 4.2.2, lm on ln y against ln x';

function readings(cells: DataName): [Argument, Argument] {
  return [
    { cells, column: 'x' },
    { cells, column: 'y' },
  ];
}

const ozone = [...readings('ozone'), 'straight line'];
const planets = readings('planets');
const lamp = [...readings('lamp'), 'E(T) = a*T^b'];
const bottle = [...readings('bottle'), 'C(t) = C0*exp(-k*t)'];

export const acceptanceChecks: readonly AcceptanceCheck[] = [
  { what: 'the functions are there', id: 'LAWS', arguments: [], cell: [2, 1], fixed: 'straight line' },
  {
    what: 'slope',
    id: 'LINE',
    arguments: ozone,
    cell: [2, 2],
    published: { value: 1.00211681802045, digits: 12, source: NORRIS },
  },
  {
    what: 'its standard uncertainty',
    id: 'LINE',
    arguments: ozone,
    cell: [2, 3],
    published: { value: 0.000429796848199937, digits: 12, source: NORRIS },
  },
  {
    what: 'intercept',
    id: 'LINE',
    arguments: ozone,
    cell: [3, 2],
    published: { value: -0.262323073774029, digits: 12, source: NORRIS },
  },
  {
    what: 'residual standard deviation',
    id: 'STRAIGHTNESS',
    arguments: ozone,
    cell: [5, 2],
    published: { value: 0.884796396144373, digits: 12, source: NORRIS },
  },
  {
    what: "the exponent of Kepler's third law",
    id: 'CONSTANT',
    arguments: [...planets, 'power', 'q'],
    published: { value: 1.49985560244902, digits: 10, source: R },
  },
  {
    what: 'the law that fits the planets best',
    id: 'COMPARE',
    arguments: planets,
    cell: [2, 2],
    fixed: 'power',
  },
  {
    what: 'a constant of an equation of your own',
    id: 'CONSTANT',
    arguments: [...lamp, 'a'],
    published: { value: 0.749945347147908, digits: 10, source: R },
  },
  {
    what: 'its standard uncertainty',
    id: 'CONSTANT',
    arguments: [...lamp, 'a', 'u'],
    published: { value: 0.0134117611415488, digits: 10, source: R },
  },
  { what: 'readings used: blanks and words left out', id: 'STRAIGHTNESS', arguments: bottle, cell: [1, 2] },
  { what: 'readings set aside', id: 'STRAIGHTNESS', arguments: bottle, cell: [2, 2] },
  { what: 'decay constant, 1/min', id: 'CONSTANT', arguments: [...bottle, 'k'] },
  { what: 'the same, with 2 % of each reading', id: 'CONSTANT', arguments: [...bottle, 'k', 'u', '', '2%'] },
  { what: 'chlorine after 75 minutes', id: 'Y.AT', arguments: [...bottle, 75], cell: [1, 1] },
  { what: 'minutes until 0.3 mg/L', id: 'X.AT', arguments: [...bottle, 0.3], cell: [1, 1] },
  { what: 'a sentence to paste', id: 'STATEMENT', arguments: [...bottle, 'k', '1/min'] },
  {
    what: 'an unknown law is refused',
    id: 'CONSTANT',
    arguments: [...readings('bottle'), 'no such law', 'k'],
    fixed: '#VALUE!',
  },
  {
    what: 'one reading is too few so far',
    id: 'CONSTANT',
    arguments: [
      { cells: 'bottle', column: 'x', first: 1 },
      { cells: 'bottle', column: 'y', first: 1 },
      'exponential',
      'p',
    ],
    fixed: '#N/A',
  },
  {
    what: 'ranges of different size are refused',
    id: 'CONSTANT',
    arguments: [
      { cells: 'bottle', column: 'x' },
      { cells: 'bottle', column: 'y', first: 4 },
      'exponential',
      'p',
    ],
    fixed: '#VALUE!',
  },
];

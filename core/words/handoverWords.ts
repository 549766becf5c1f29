import { listed, plural } from './plain.ts';

/** What the panel says where results are handed over, and what it writes into the sheet around numbers. */
export const handoverWords = {
  title: 'Hand it over',
  lead: 'Put the result into the workbook: it stays there for a colleague, a reviewer or an auditor.',
  kind: {
    block: 'Live block',
    charts: 'Charts',
    card: 'Result card',
    workings: 'Workings',
  },
  about: {
    block: 'Constants, line, sentence and checks as formulas. Readings typed below come in by themselves.',
    charts: 'The straight axes and the curve with its band, as charts of the spreadsheet program.',
    card: 'One page with the constant in large type, to print or to send.',
    workings: 'Every step in ordinary formulas, for an audit without the add-in.',
  },
  place: {
    block: 'Write live block',
    charts: 'Draw charts',
    card: 'Write result card',
    workings: 'Write workings',
  },
  where: 'Top left cell',
  whereAuto: 'right of the readings',
  whereSelected: 'Take the selected cell',
  whereWrong: (text: string): string => `'${text}' is not a cell: type one such as F5 or Sheet1!F5.`,
  constant: 'Constant in large type',
  written: (what: string, place: string): string => `${what} written to ${place}.`,
  occupied: (cells: number, area: string): string =>
    `${plural(cells, 'cell')} in ${area} ${cells === 1 ? 'is' : 'are'} not empty. Overwrite ${cells === 1 ? 'it' : 'them'}? “Take back” puts ${cells === 1 ? 'it' : 'them'} back.`,
  overwrite: 'Overwrite',
  keep: 'Leave them',
  kept: 'Nothing was written.',
  placed: 'In the workbook',
  placedAt: (kind: string, place: string): string => `${kind}, ${place}`,
  live: 'live',
  frozen: 'frozen',
  show: 'Show',
  freeze: 'Freeze',
  freezeOf: (what: string): string => `Freeze ${what}: values in place of formulas`,
  thaw: 'Thaw',
  thawOf: (what: string): string => `Thaw ${what}: formulas in place of values`,
  takeBack: 'Take back',
  takeBackOf: (what: string): string => `Take back ${what}`,
  frozenNow: (what: string): string => `${what}: values now stand in place of the formulas.`,
  thawedNow: (what: string): string => `${what}: the formulas are back and follow the readings.`,
  takenBack: (what: string): string => `${what} is taken back.`,
  movedAway: (): string =>
    'Rows or columns were moved since this was frozen, so its formulas would point to the wrong cells. Take it back and write it anew.',
  others: (cells: number, sheet: string): string =>
    `${plural(cells, 'cell')} on the sheet ${sheet} ${cells === 1 ? 'was' : 'were'} added by someone else. Delete the whole sheet all the same?`,
  deleteSheet: 'Delete the sheet',
  leftOut: (positions: readonly number[]): string =>
    `${positions.length === 1 ? 'Reading' : 'Readings'} ${listed(positions.map(String))} ${positions.length === 1 ? 'is' : 'are'} left out for a look only: what is handed over uses every reading in the cells. To leave one out for good, clear its cell or write why beside it.`,
  chartsNeedCurve: (response: string): string =>
    `The law cannot be solved for ${response}, so only the straight axes are drawn.`,

  sheetName: {
    block: 'Tautline result',
    charts: 'Tautline charts',
    card: 'Result',
    workings: 'Workings',
  },

  law: 'Law',
  uncertaintyOf: (name: string): string => `Standard uncertainty of ${name}`,
  known: 'Known constant',
  value: 'value',
  standardUncertainty: 'standard uncertainty',
  option: 'Option',
  constants: 'Constants',
  line: (plot: string, against: string): string => `Line: ${plot} against ${against}`,
  sentence: 'In a sentence',
  straightness: 'How straight',
  checks: 'Checks',
  readingsOf: (y: string, x: string): string => `Readings: ${y} against ${x}`,
  inputs: 'Given (change these cells, and everything below follows)',

  chartData: 'Data of the charts',
  chartAxes: 'Readings on the straight axes (TAUT.AXES)',
  chartPlotted: 'as plotted',
  chartLine: 'Line',
  chartCurve: 'Curve and band (TAUT.Y.AT)',
  chartReadings: 'Readings',
  chartLow: 'Low',
  chartHigh: 'High',
  straightTitle: (plot: string, against: string): string => `${plot} against ${against}`,
  curveTitle: (y: string, x: string): string => `${y} against ${x}`,
  axisTitle: (name: string, unit: string): string => {
    if (unit === '') return name;
    return `${name} / ${/^[^\s/*·()]+$/.test(unit) || /^1\/[^\s/*·()]+$/.test(unit) ? unit : `(${unit})`}`;
  },
  straightAxisTitle: (text: string, units: readonly string[]): string =>
    units.length === 0 ? text : `${text}   (${units.join(', ')})`,
  inUnit: (symbol: string, unit: string): string => `${symbol} in ${unit}`,

  result: 'RESULT',
  measured: (y: string, x: string): string => `${y} against ${x}`,
  interval: (percent: string): readonly [string, string] => [`${percent} % interval: `, ' to '],
  readingsUsed: (y: string, x: string): readonly [string, string, string] => [
    `Readings: ${y} against ${x}; `,
    ' used, ',
    ' set aside',
  ],
  allConstants: 'All constants',
  findings: 'Findings',
  howFound: 'How it was found',
  noFindings: 'Nothing speaks against it.',
  moreFindings: (count: number): string =>
    `The first ${count} findings are shown; the live block has all of them.`,
  lawLine: (equation: string): string => `Law: ${equation}`,
  formLine: (plot: string, against: string, slope: string, intercept: string): string =>
    `Straight form: ${plot} against ${against}; slope = ${slope}, intercept = ${intercept}`,
  footer: (version: string, date: string): string => `Tautline ${version} · ${date}`,
  straightPicture: 'Readings on the straight axes, with the line',
  curvePicture: 'Readings on the original axes, with the curve and its band',
};

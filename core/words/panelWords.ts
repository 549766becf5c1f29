import { plural } from './plain.ts';

/** Text as a message quotes it: cut to 60 characters. */
function quoted(text: string): string {
  return `'${text.length > 60 ? `${text.slice(0, 59)}…` : text}'`;
}

/** What the panel says when the spreadsheet program refuses something. */
export const hostWords = {
  trouble: (kind: 'gone' | 'protected' | 'busy' | 'selection' | 'size' | 'other', detail: string): string => {
    switch (kind) {
      case 'gone':
        return 'These cells cannot be found any more: the sheet or the range was deleted or renamed.';
      case 'protected':
        return 'The sheet is protected, so its cells cannot be changed; unprotect it and try again.';
      case 'busy':
        return 'A cell is being edited: finish it with Enter and try again.';
      case 'selection':
        return 'Select cells: what is selected now is something else, such as a chart.';
      case 'size':
        return 'These are more cells than can be read at once: choose a smaller range.';
      case 'other':
        return `The spreadsheet program refused: ${detail}`;
    }
  },
  noSheet: (name: string): string => `There is no sheet ${quoted(name)} in this workbook any more.`,
  blankSelection: (): string => 'The selected cells are blank: select the cells that hold your readings.',
  noAddress: (text: string): string =>
    text === ''
      ? 'Type a range such as B4:B60.'
      : `${quoted(text)} is not a range of cells: type one such as B4:B60 or Sheet1!B4:B60.`,
  noHost: (): string =>
    'Tautline works inside a spreadsheet: open it from the ribbon of the spreadsheet program.',
};

/** The head of the panel and what concerns the whole of it. */
export const panelWords = {
  undo: 'Undo',
  redo: 'Redo',
  undoOf: (what: string): string => `Undo: ${what}`,
  redoOf: (what: string): string => `Redo: ${what}`,
  opening: 'Opening …',
  jump: 'Go to',
  jumps: { readings: 'Readings', laws: 'Laws', depth: 'In depth' },
  readAgain: 'Read the cells again',
  dismiss: 'Dismiss',
  fault: (detail: string): string =>
    `Something went wrong inside the panel: ${detail}. Your choices are kept; undo the last step or read the cells again.`,
  undone: (what: string): string => `Taken back: ${what}.`,
  redone: (what: string): string => `Done again: ${what}.`,
};

/** Names of steps, as the undo button says them. */
export const stepWords = {
  readings: 'choose readings',
  ranges: 'change the ranges',
  heading: 'name the columns',
  swap: 'swap x and y',
  grow: 'take the reading typed below',
  law: (law: string): string => `choose ${law}`,
  addLaw: (law: string): string => `compare ${law}`,
  removeLaw: (law: string): string => `stop comparing ${law}`,
  known: (name: string): string => `set ${name}`,
  uncertainty: (axis: 'x' | 'y'): string => `set the uncertainty of ${axis}`,
  option: (name: string): string => `set ${name}`,
  unit: (name: string): string => `name the unit of ${name}`,
  leaveOut: (position: number): string => `leave out reading ${position}`,
  takeBack: (position: number): string => `take reading ${position} back in`,
  takeAllBack: 'take all readings back in',
};

/** The section on readings. */
export const readingsWords = {
  title: 'Readings',
  startTitle: 'From two columns to a constant',
  startSelect: 'Select two columns in the sheet: what you set or waited for (x), then what you read (y).',
  startUse: 'Press the button below. Headers such as “time / h” above the cells become names and units.',
  startLook: 'Look which law draws your readings straight, then read its constants.',
  startHint: 'One click into a table is enough: the block around the cell is taken.',
  use: 'Use the selection',
  selectedNow: (address: string, shape: string): string => `Selected now: ${address} (${shape})`,
  shape: (rows: number, columns: number): string => `${plural(rows, 'row')} × ${plural(columns, 'column')}`,
  areas: (count: number): string => plural(count, 'area'),
  selectTwo: (found: number): string =>
    found === 0
      ? 'Select two columns of readings: there are no numbers in the selected cells.'
      : 'Select two columns of readings, x and y: only one of the selected columns holds numbers.',
  selectEqual: (x: number, y: number): string =>
    `Select as many cells for y as for x: there are ${x} for x and ${y} for y.`,
  used: (count: number): string => `${count} used`,
  setAside: (count: number): string => `${count} set aside`,
  leftOut: (count: number): string => `${count} left out by you`,
  waiting: (count: number): string => `${count} not there yet`,
  showCell: (position: number): string => `Show reading ${position} in the sheet`,
  edit: 'Ranges, names and units',
  xCells: 'Cells of x',
  yCells: 'Cells of y',
  name: (axis: 'x' | 'y'): string => `Name of ${axis}`,
  unit: (axis: 'x' | 'y'): string => `Unit of ${axis}`,
  column: (axis: 'x' | 'y'): string => `Column of ${axis}`,
  swap: 'Swap x and y',
  grew: (address: string): string => `The reading typed below is taken in: y is now ${address}.`,
  gone: 'The cells of the readings were deleted. Select the readings anew, or undo the deletion in the sheet.',
  spreadLeft:
    'The uncertainties in cells stood beside the former readings and were left there. Give them anew if there are some.',
  spreadGone:
    'The cells of an uncertainty were deleted; the readings count without it. Give the uncertainty anew if there is one.',
  replace: 'Use the selection instead',
};

/** The section that compares laws. */
export const lawsWords = {
  title: 'Laws side by side',
  lead: 'Each small plot shows your readings on the axes that make this law a straight line. Look for dots that follow the line.',
  choose: 'Laws that can take these readings, best supported first',
  support: (percent: string): string => `${percent} %`,
  supportName: 'support',
  bowName: 'bow',
  misfitName: 'misfit',
  none: '–',
  deeper: 'See it in depth',
  plot: (plot: string, against: string): string => `${plot} against ${against}`,
  impossible: (count: number): string => `Not possible with these readings (${count})`,
  progress: (done: number, total: number): string => `Fitting law ${Math.min(done + 1, total)} of ${total}`,
  cancel: 'Cancel',
  cancelled: 'The comparison was cancelled; the laws fitted so far are shown.',
  resume: 'Compare again',
  trade: 'A law of the trade',
  tradeFirst: 'Choose one to compare …',
  own: 'Your own law',
  ownExample: 'for example  V(t) = V0*exp(-t/tau)',
  ownHelp: 'In your own symbols; the left side says which is y and which is x.',
  compare: 'Compare it',
  remove: (law: string): string => `Stop comparing ${law}`,
  straight: (plot: string, against: string, slope: string, intercept: string): string =>
    `plot ${plot} against ${against}; slope = ${slope}; intercept = ${intercept}`,
  explain: 'What the three figures mean',
  explainSupport:
    'Support: of the laws shown, how the evidence divides among them; it rewards a close fit and charges for constants.',
  explainBow:
    'Bow: how far the readings bend away from their line, in percent of its rise. Near 0 is straight; a sign says which way.',
  explainMisfit: 'Misfit: the typical distance between readings and curve, in the units of y.',
  noSupport: 'Support needs a law whose x axis is free of y, and readings without an uncertainty in x.',
};

/** The section that shows one law in depth. */
export const depthWords = {
  title: 'One law in depth',
  pick: 'Choose a law to see it drawn large, with its constants and everything that speaks against it.',
  straightTitle: 'On straight axes',
  residualTitle: 'What the line leaves',
  curveTitle: 'On the original axes',
  bandNote: (percent: string, what: 'curve' | 'reading'): string =>
    what === 'curve'
      ? `Band: where the curve lies, ${percent} %.`
      : `Band: where a new reading falls, ${percent} %.`,
  fitting: (law: string): string => `Fitting ${law} …`,
  stopped: 'No line yet',
  setOutsideAside: 'Set readings outside the law aside',
  constants: 'Constants',
  standardUncertainty: 'Standard uncertainty',
  interval: (percent: string): string => `${percent} % interval`,
  to: (low: string, high: string): string => `${low} to ${high}`,
  noUncertainty: 'no scatter to judge by',
  given: (list: string): string => `Given: ${list}`,
  givenValue: (name: string, value: string): string => `${name} = ${value}`,
  unitOf: (name: string): string => `Unit of ${name}`,
  unit: 'unit',
  checks: 'Checks',
  checking: 'Checking …',
  noChecks: 'Nothing to remark: the readings lie on the line as scatter would have it.',
  level: { stop: 'Stop', caution: 'Caution', note: 'Note' },
  statement: 'In a sentence',
  statementFor: 'Constant',
  copy: 'Copy the sentence',
  copied: 'Copied.',
  copyFailed: 'Copying is not allowed here: select the sentence and copy it with the keyboard.',
};

/** The list of readings of the chosen law. */
export const listWords = {
  title: 'Readings one by one',
  help: 'Arrow keys move, Enter shows the cell.',
  reading: 'Reading',
  name: (position: number): string => `Reading ${position}`,
  residual: 'Residual',
  standardised: 'Standardised residual',
  leverage: 'Leverage',
  leaveOut: 'Leave out and see',
  takeIn: 'Take back in',
  takeAllIn: 'Take all back in',
  show: 'Show in the sheet',
  left: 'left out by you',
  more: (shown: number, total: number): string => `The ${shown} most telling of ${total} readings.`,
  none: 'Select a dot or a row to see a reading.',
};

/** What the user knows beforehand, and how the line is to be fitted. */
export const knownWords = {
  title: 'What you know beforehand',
  constants: 'Known constants',
  constantsHelp: 'Type a value, with its standard uncertainty if it has one: 12±0.05',
  found: 'from the readings',
  builtIn: (value: string): string => `${value}, built in`,
  uncertaintyY: (name: string): string => `Standard uncertainty of ${name}`,
  uncertaintyX: (name: string): string => `Standard uncertainty of ${name}`,
  spread: {
    none: 'not known: judge by the scatter',
    equal: 'not known, the same for all readings',
    proportional: 'not known, in proportion to the reading',
    number: 'a number or a percentage',
    range: 'one for each reading, in cells',
    exact: 'none: x is exact',
  },
  fromColumn: (name: string): string => `in the column ${name}`,
  spreadText: 'such as 0.05 or 2%',
  spreadRange: 'cells, such as D4:D60',
  fromSelection: 'Take the selected cells',
  fit: 'How to fit',
  form: 'Straight axes',
  formOption: (number: number, plot: string, against: string): string =>
    `${number}. ${plot} against ${against}`,
  coverage: 'Coverage of intervals',
  coverageOther: (value: string): string => `${value} %`,
  intercept: 'Hold the intercept at the value that the known constants give it',
  direct: 'Fit the curve directly, in the units of y',
  reading: 'Widen the band to hold a new reading',
  outside: 'Set readings outside the law aside',
  montecarlo: 'Intervals by repeated simulation',
};

/** Reading off the curve. */
export const readOffWords = {
  title: 'Read off the curve',
  given: (name: string): string => `Given ${name}`,
  unitHint: (unit: string): string => (unit === '' ? '' : `in ${unit}`),
  nothing: 'Type a number.',
  result: (name: string, value: string): string => `${name} = ${value}`,
  range: (low: string, high: string, percent: string): string => `${percent} % interval ${low} to ${high}`,
  beyond: (low: string, high: string): string => `Outside the readings, which run from ${low} to ${high}.`,
  notNumber: (text: string): string => `${quoted(text)} is not a number.`,
};

/** Planning the next reading. */
export const planWords = {
  title: 'The next reading',
  open: 'Where it would tell the most, and how many are needed',
  constant: 'Constant',
  between: (name: string): string => `Between which values of ${name} can a reading be taken?`,
  from: (unit: string): string => withUnit('From', unit),
  to: (unit: string): string => withUnit('To', unit),
  at: (name: string, value: string, unit: string): string =>
    `Take it at ${name} = ${value} ${unit}`.trimEnd(),
  gain: (name: string, now: string, after: string, unit: string): string =>
    `One reading there brings the standard uncertainty of ${name} from ${now} to ${`${after} ${unit}`.trimEnd()}.`,
  noScatter: (name: string): string =>
    `What it brings ${name} cannot be said yet: there is no scatter to judge by.`,
  wanted: (name: string, unit: string): string => `Wanted standard uncertainty of ${withUnit(name, unit)}`,
  needed: (more: number, total: number): string =>
    `${plural(more, 'more reading')} spread like these, ${total} in all.`,
  reached: 'The readings at hand are enough.',
  notNumber: (text: string): string => `${quoted(text)} is not a number.`,
};

function withUnit(name: string, unit: string): string {
  return unit === '' ? name : `${name} in ${unit}`;
}

import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import { textLiteral } from '../../core/workings/literals.ts';
import type { Choice } from '../state/choice.ts';
import { mainConstant } from '../state/mainConstant.ts';
import { type Block, BlockBuilder } from './block.ts';
import { headingText } from './headingText.ts';
import type { Corner } from './liveBlock.ts';
import { cellsBelow } from './ownCells.ts';
import { type CallArguments, sheetCall } from './sheetCall.ts';
import { version } from './version.ts';

/** Where the card leaves room for its pictures: rows from 0, over the columns within the margins. */
export interface CardBlock {
  readonly block: Block;
  readonly pictures: { readonly top: number; readonly bottom: number };
}

/** Columns: a margin, five of content, a margin. */
const WIDTHS: readonly number[] = [20, 116, 122, 150, 112, 112, 20];
const FIRST = 1;
const LAST = 5;
const STATEMENT_ROWS = 5;
const PICTURES_TOP = 15;
const PICTURE_ROWS = 11;
const PICTURE_ROW = 24;
const TABLE_TOP = PICTURES_TOP + PICTURE_ROWS + 2;
const FINDINGS = 6;

/**
 * Plans the result card: one page with the constant in large type.
 * @param constant the constant in large type; the main one when it is not the law's
 * @param date the day, written as it is
 */
export function cardBlock(
  choice: Choice,
  fit: Fit,
  given: CallArguments,
  corner: Corner,
  constant: string,
  date: string,
): CardBlock {
  const build = new BlockBuilder();
  const { law, form } = fit;
  const own = cellsBelow(corner);
  const wide = { across: LAST - FIRST };
  const names = fit.constants.map(({ name }) => name);
  const shown = mainConstant(fit, names, constant);
  const unit = choice.units?.get(shown) ?? '';
  const heading = (text: string): void => {
    for (let column = FIRST; column <= LAST; column++) {
      build.text(column, column === FIRST ? text : '', 'heading');
    }
    build.row++;
  };
  const row = (pixels: number): void => void build.heights.set(build.row, pixels);

  row(12);
  build.row = 1;
  build.text(FIRST, handoverWords.result, 'eyebrow');
  build.text(LAST, date, 'date');
  build.row++;
  row(30);
  const [y, x] = [headingText(choice.yHeading, law.response), headingText(choice.xHeading, law.predictor)];
  build.text(FIRST, handoverWords.measured(y, x), 'title');
  build.row++;
  build.formula(FIRST, countFormula(given), 'note');
  build.row += 2;

  // The rows of the table below that the large type rounds.
  const tableRow = TABLE_TOP + 1 + fit.constants.findIndex(({ name }) => name === shown);
  const value = own(tableRow, 2);
  const uncertainty = own(tableRow, 3);
  const [low, high] = [own(tableRow, 4), own(tableRow, 5)];
  heading(unit === '' ? shown : handoverWords.inUnit(shown, unit));
  row(48);
  build.formula(FIRST, pairFormula(value, uncertainty, unit), 'large', wide);
  build.row++;
  const percent = String(Number((100 * fit.settings.options.coverage).toPrecision(6)));
  build.formula(FIRST, intervalFormula(percent, low, high, uncertainty, unit), 'label');
  build.row += 2;
  const statement = sheetCall('STATEMENT', given, [textLiteral(shown), textLiteral(unit)]);
  build.formula(FIRST, statement, 'statement', { ...wide, down: STATEMENT_ROWS - 1 });

  for (let k = 0; k < PICTURE_ROWS; k++) build.heights.set(PICTURES_TOP + k, PICTURE_ROW);

  build.row = TABLE_TOP - 1;
  heading(handoverWords.allConstants);
  build.formula(FIRST, sheetCall('CONSTANTS', given), 'value', {
    spill: { rows: fit.constants.length + 1, columns: 5, header: true, names: true },
  });
  build.row += fit.constants.length + 2;
  heading(handoverWords.findings);
  const checks = sheetCall('CHECKS', given);
  for (let k = 2; k < FINDINGS + 2; k++) {
    build.formula(FIRST, `IFERROR(INDEX(${checks},${k},1),"")`, 'level');
    build.formula(
      FIRST + 1,
      `IFERROR(INDEX(${checks},${k},2),${k === 2 ? textLiteral(handoverWords.noFindings) : '""'})`,
      'finding',
      { across: LAST - FIRST - 1 },
    );
    build.row++;
  }
  const more = textLiteral(handoverWords.moreFindings(FINDINGS));
  build.formula(FIRST + 1, `IFERROR(IF(ROWS(${checks})>${FINDINGS + 1},${more},""),"")`, 'note');
  build.row += 2;

  heading(handoverWords.howFound);
  build.text(
    FIRST,
    handoverWords.lawLine(law.name === '' ? law.equation : `${law.name}, ${law.equation}`),
    'note',
  );
  build.row++;
  build.text(FIRST, handoverWords.formLine(form.plot, form.against, form.slope, form.intercept), 'note');
  build.row++;
  build.text(FIRST, handoverWords.footer(version, date), 'note');
  build.row++;
  return {
    block: {
      cells: build.cells,
      rows: build.row,
      columns: WIDTHS.length,
      widths: WIDTHS,
      heights: build.heights,
    },
    pictures: { top: PICTURES_TOP, bottom: PICTURES_TOP + PICTURE_ROWS - 1 },
  };
}

/** How many readings are used and set aside, in a sentence. */
function countFormula(given: CallArguments): string {
  const count = (row: number): string => `INDEX(${sheetCall('STRAIGHTNESS', given)},${row},2)`;
  const [before, between, after] = handoverWords.readingsUsed(plainPlace(given.y), plainPlace(given.x));
  return `${textLiteral(before)}&${count(1)}&${textLiteral(between)}&${count(2)}&${textLiteral(after)}`;
}

function intervalFormula(
  percent: string,
  low: string,
  high: string,
  uncertainty: string,
  unit: string,
): string {
  const [open, to] = handoverWords.interval(percent);
  const ends = `${textLiteral(open)}&${rounded(low, uncertainty)}&${textLiteral(to)}&${rounded(high, uncertainty)}`;
  return `IF(AND(ISNUMBER(${low}),ISNUMBER(${high})),${ends}${unitTail(unit)},"")`;
}

function unitTail(unit: string): string {
  return unit === '' ? '' : `&${textLiteral(` ${unit}`)}`;
}

function plainPlace(reference: string): string {
  return reference.replaceAll('$', '');
}

/** Decimals that leave an uncertainty two significant digits, as a formula. */
function decimals(uncertainty: string): string {
  return `(1-INT(LOG10(ABS(${uncertainty}))))`;
}

/** A number rounded like an uncertainty, as text; in powers of ten where it is very large or small. */
function rounded(value: string, uncertainty: string): string {
  const places = decimals(uncertainty);
  const plain = `FIXED(${value},${places},TRUE)`;
  const power = `INT(LOG10(ABS(${value})))`;
  const scaled = `FIXED(${value}/10^${power},MAX(0,${places}+${power}),TRUE)&"·10^"&${power}`;
  return `IF(${value}=0,"0",IF(OR(${power}<-4,${power}>6),${scaled},${plain}))`;
}

/** Value ± uncertainty in large type; the value alone where there is no uncertainty. */
function pairFormula(value: string, uncertainty: string, unit: string): string {
  const places = decimals(uncertainty);
  const power = `INT(LOG10(ABS(${value})))`;
  const both = `FIXED(${value},${places},TRUE)&" ± "&FIXED(${uncertainty},${places},TRUE)`;
  const scaled = `"("&FIXED(${value}/10^${power},MAX(0,${places}+${power}),TRUE)&" ± "&FIXED(${uncertainty}/10^${power},MAX(0,${places}+${power}),TRUE)&")·10^"&${power}`;
  const alone = `TEXT(${value},"0.000E+00")`;
  return `IF(N(${uncertainty})>0,IF(OR(${power}<-4,${power}>6),${scaled},${both}),${alone})${unitTail(unit)}`;
}

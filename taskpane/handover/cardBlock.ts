import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import { textLiteral } from '../../core/workings/literals.ts';
import type { Choice } from '../state/choice.ts';
import { type Block, BlockBuilder } from './block.ts';
import { headingText } from './headingText.ts';
import type { Corner } from './liveBlock.ts';
import { mainConstant } from './mainConstant.ts';
import { cellsBelow } from './ownCells.ts';
import { type CallArguments, sheetCall } from './sheetCall.ts';
import { version } from './version.ts';

/** Where the card leaves room for its pictures: rows from 0, over the columns within the margins. */
export interface CardBlock {
  readonly block: Block;
  readonly pictures: { readonly top: number; readonly bottom: number };
}

/** Columns: a margin, five of content, a margin. */
const WIDTHS: readonly number[] = [20, 132, 122, 132, 112, 112, 20];
const FIRST = 1;
const LAST = 5;
const PICTURE_ROWS = 13;
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
  const shown = fit.constants.some(({ name }) => name === constant) ? constant : mainConstant(fit);
  const unit = choice.units?.get(shown) ?? '';
  const part = (which: string): string =>
    sheetCall('CONSTANT', given, [textLiteral(shown), textLiteral(which)]);
  const height = (pixels: number): void => void build.heights.set(build.row, pixels);

  height(12);
  build.row = 1;
  build.text(FIRST, handoverWords.result, 'eyebrow');
  build.text(LAST, date, 'note');
  build.row++;
  height(30);
  build.text(
    FIRST,
    handoverWords.measured(
      headingText(choice.yHeading, law.response),
      headingText(choice.xHeading, law.predictor),
    ),
    'title',
  );
  build.row++;
  const count = (row: number): string => `INDEX(${sheetCall('STRAIGHTNESS', given)},${row},2)`;
  const [before, between, after] = handoverWords.readingsUsed(
    `${plainPlace(given.y)} ~ ${plainPlace(given.x)}`.replace(' ~ ', ', '),
  );
  build.formula(
    FIRST,
    `${textLiteral(before)}&${count(1)}&${textLiteral(between)}&${count(2)}&${textLiteral(after)}`,
    'note',
  );
  build.row += 2;

  // The numbers behind the large type stand in the right margin's neighbours, so that plain formulas can round them.
  const valueRow = build.row;
  build.text(FIRST, unit === '' ? shown : handoverWords.axisTitle(shown, unit), 'heading');
  for (let column = FIRST + 1; column <= LAST; column++) build.text(column, '', 'heading');
  build.row++;
  height(48);
  const tableTop = PICTURE_ROWS + 15;
  const index = fit.constants.findIndex(({ name }) => name === shown);
  const value = own(tableTop + index + 1, FIRST + 1);
  const uncertainty = own(tableTop + index + 1, FIRST + 2);
  build.formula(FIRST, roundedPair(value, uncertainty, unit), 'large', wide);
  build.row++;
  const percent = String(Number((100 * fit.settings.options.coverage).toPrecision(6)));
  const [open, to] = handoverWords.interval(percent);
  const low = own(tableTop + index + 1, FIRST + 3);
  const high = own(tableTop + index + 1, FIRST + 4);
  build.formula(
    FIRST,
    `IF(AND(ISNUMBER(${low}),ISNUMBER(${high})),${textLiteral(open)}&${rounded(low, uncertainty)}&${textLiteral(to)}&${rounded(high, uncertainty)}${unit === '' ? '' : `&${textLiteral(` ${unit}`)}`},"")`,
    'label',
  );
  build.row += 2;
  build.formula(FIRST, sheetCall('STATEMENT', given, [textLiteral(shown), textLiteral(unit)]), 'statement', {
    ...wide,
    down: 2,
  });
  build.row += 4;
  const pictures = { top: build.row, bottom: build.row + PICTURE_ROWS - 1 };
  build.row += PICTURE_ROWS;
  void valueRow;
  void part;

  build.row = tableTop - 1;
  build.text(FIRST, handoverWords.allConstants, 'heading');
  for (let column = FIRST + 1; column <= LAST; column++) build.text(column, '', 'heading');
  build.row = tableTop;
  build.formula(FIRST, sheetCall('CONSTANTS', given), 'value', {
    spill: { rows: fit.constants.length + 1, columns: 5, header: true },
  });
  build.row += fit.constants.length + 2;

  build.text(FIRST, handoverWords.findings, 'heading');
  for (let column = FIRST + 1; column <= LAST; column++) build.text(column, '', 'heading');
  build.row++;
  const checks = sheetCall('CHECKS', given);
  for (let k = 0; k < FINDINGS; k++) {
    build.formula(FIRST, `IFERROR(INDEX(${checks},${k + 2},1),"")`, 'finding');
    build.formula(FIRST + 1, `IFERROR(INDEX(${checks},${k + 2},2),"")`, 'finding', {
      across: LAST - FIRST - 1,
    });
    build.row++;
  }
  build.formula(
    FIRST + 1,
    `IFERROR(IF(ROWS(${checks})>${FINDINGS + 1},${textLiteral(handoverWords.moreFindings(FINDINGS))},""),"")`,
    'note',
  );
  build.row += 2;

  build.text(FIRST, handoverWords.lawLine(law.equation), 'note');
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
    pictures,
  };
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
function roundedPair(value: string, uncertainty: string, unit: string): string {
  const places = decimals(uncertainty);
  const power = `INT(LOG10(ABS(${value})))`;
  const both = `FIXED(${value},${places},TRUE)&" ± "&FIXED(${uncertainty},${places},TRUE)`;
  const scaled = `"("&FIXED(${value}/10^${power},MAX(0,${places}+${power}),TRUE)&" ± "&FIXED(${uncertainty}/10^${power},MAX(0,${places}+${power}),TRUE)&")·10^"&${power}`;
  const tail = unit === '' ? '' : `&${textLiteral(` ${unit}`)}`;
  const alone = `TEXT(${value},"0.000E+00")`;
  return `IF(N(${uncertainty})>0,IF(OR(${power}<-4,${power}>6),${scaled},${both}),${alone})${tail}`;
}

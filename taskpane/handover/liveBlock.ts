import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import type { Choice, SpreadEntry } from '../state/choice.ts';
import { mainConstant } from '../state/mainConstant.ts';
import { type Block, BlockBuilder } from './block.ts';
import { headingText } from './headingText.ts';
import { cellsBelow } from './ownCells.ts';
import { type CallArguments, literalArguments, sheetCall } from './sheetCall.ts';

/** Where a block's top left cell lies. */
export interface Corner {
  readonly sheet: string;
  readonly row: number;
  readonly column: number;
}

/** Rows kept for the checks, whose number follows the readings. */
const CHECK_ROWS = 10;
const WIDTHS: readonly number[] = [196, 118, 150, 112, 112];

/** The live block, and the arguments that refer to its labelled cells. */
export interface LiveBlock {
  readonly block: Block;
  readonly arguments: CallArguments;
}

/**
 * Plans the live block: the law, known constants, uncertainties and options in labelled cells, and the sheet functions
 * that refer to them.
 */
export function liveBlock(choice: Choice, fit: Fit, corner: Corner, constant: string): LiveBlock {
  const build = new BlockBuilder();
  const { law, form, settings } = fit;
  const cell = cellsBelow(corner);
  const literal = literalArguments(choice, fit, corner.sheet);

  const [y, x] = [headingText(choice.yHeading, law.response), headingText(choice.xHeading, law.predictor)];
  build.text(0, handoverWords.measured(y, x), 'title');
  build.row++;
  build.text(0, handoverWords.readingsOf(placeText(literal.y), placeText(literal.x)), 'note');
  build.row += 2;

  build.text(0, handoverWords.inputs, 'section');
  for (let column = 1; column < WIDTHS.length; column++) build.text(column, '', 'section');
  build.row++;
  build.text(0, handoverWords.law, 'label');
  build.text(1, choice.law, 'given');
  const lawCell = cell(build.row, 1);
  build.row++;
  const spread = (name: string, entry: SpreadEntry, written: string): string => {
    if (entry.kind === 'range' || written === '') return written;
    build.text(0, handoverWords.uncertaintyOf(name), 'label');
    const value = Number(entry.text);
    if (Number.isFinite(value)) build.number(1, value, 'given');
    else build.text(1, entry.text.trim(), 'given');
    return cell(build.row++, 1);
  };
  const uY = spread(law.response, choice.spreadY, literal.uY);
  const uX = spread(law.predictor, choice.spreadX, literal.uX);
  let known = '';
  if (settings.known.size > 0) {
    build.text(0, handoverWords.known, 'header');
    build.text(1, handoverWords.value, 'header');
    build.text(2, handoverWords.standardUncertainty, 'header');
    build.row++;
    known = cell(build.row, 0, settings.known.size, 3);
    for (const [name, { value, standardUncertainty }] of settings.known) {
      build.text(0, name, 'given');
      build.number(1, value, 'given');
      build.number(2, standardUncertainty, 'given');
      build.row++;
    }
  }
  const options = new Map([['coverage', String(settings.options.coverage)], ...choice.options]);
  build.text(0, handoverWords.option, 'header');
  build.text(1, handoverWords.value, 'header');
  build.row++;
  const optionCells = cell(build.row, 0, options.size, 2);
  for (const [name, value] of options) {
    build.text(0, name, 'label');
    const number = Number(value);
    if (Number.isFinite(number)) build.number(1, number, 'given');
    else build.text(1, value, 'given');
    build.row++;
  }
  const given: CallArguments = { ...literal, law: lawCell, known, uY, uX, options: optionCells };

  const section = (title: string): void => {
    build.row++;
    build.text(0, title, 'section');
    for (let column = 1; column < WIDTHS.length; column++) build.text(column, '', 'section');
    build.row++;
  };
  const table = (name: string, rows: number, columns: number, header: boolean): void => {
    build.formula(0, sheetCall(name, given), 'value', { spill: { rows, columns, header, names: true } });
    build.row += rows;
  };
  section(handoverWords.constants);
  table('CONSTANTS', fit.constants.length + 1, 5, true);
  section(handoverWords.sentence);
  const names = fit.constants.map(({ name }) => name);
  const shown = mainConstant(fit, names, constant);
  const unit = choice.units?.get(shown) ?? '';
  build.formula(0, sheetCall('STATEMENT', given, [quoted(shown), quoted(unit)]), 'label');
  build.row++;
  section(handoverWords.line(form.plot, form.against));
  table('LINE', 4, 3, true);
  section(handoverWords.straightness);
  table('STRAIGHTNESS', 13, 2, false);
  section(handoverWords.checks);
  build.formula(0, sheetCall('CHECKS', given), 'label', {
    spill: { rows: CHECK_ROWS, columns: 2, header: true, names: false },
  });
  build.row += CHECK_ROWS;
  return {
    block: { cells: build.cells, rows: build.row, columns: WIDTHS.length, widths: WIDTHS },
    arguments: given,
  };
}

function quoted(text: string): string {
  return `"${text.replaceAll('"', '""')}"`;
}

function placeText(reference: string): string {
  return reference.replaceAll('$', '');
}

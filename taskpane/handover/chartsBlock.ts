import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import { cellAt } from '../state/cellOfReading.ts';
import type { Choice } from '../state/choice.ts';
import { type AxisTitles, curveTitles, straightTitles } from './axisTitles.ts';
import { type Block, BlockBuilder } from './block.ts';
import type { Corner } from './liveBlock.ts';
import { cellsBelow } from './ownCells.ts';
import { type CallArguments, fixedPlace, sheetCall } from './sheetCall.ts';

/** A series of a chart: ranges on the chart's own sheet, without the sheet's name. */
export interface PlannedSeries {
  readonly name: string;
  readonly x: string;
  readonly y: string;
  readonly look: 'readings' | 'line' | 'band';
}

export interface PlannedChart extends AxisTitles {
  readonly title: string;
  readonly series: readonly PlannedSeries[];
}

export interface ChartsBlock {
  readonly block: Block;
  readonly charts: readonly PlannedChart[];
}

/** Points of the curve. */
const CURVE_POINTS = 61;
/** First row of data below the headers. */
const FIRST = 3;

/**
 * Plans the cells that the charts are bound to. What is not a reading is plotted as #N/A at a place on the axis: a
 * text among the x values would make the spreadsheet program number all points instead.
 */
export function chartsBlock(choice: Choice, fit: Fit, given: CallArguments, corner: Corner): ChartsBlock {
  const build = new BlockBuilder();
  const { law, form, readings } = fit;
  const { count } = readings;
  const own = cellsBelow(corner);
  const column = (left: number, rows: number): string => own(FIRST, left, rows, 1);
  const plotted = (left: number, entry: (row: number) => string, rows: number): void => {
    for (let i = 0; i < rows; i++) {
      build.row = FIRST + i;
      build.formula(left, entry(FIRST + i), 'entry');
    }
  };
  const head = (left: number, texts: readonly string[]): void => {
    build.row = FIRST - 1;
    texts.forEach((text, k) => {
      build.text(left + k, text, 'header');
    });
  };
  const number = (cell: string): string => `IF(ISNUMBER(${cell}),${cell},NA())`;

  build.row = 0;
  for (let left = 0; left < (law.curve === null ? 12 : 21); left++) {
    build.text(left, left === 0 ? handoverWords.chartData : '', 'section');
  }
  build.row = 1;
  build.text(0, handoverWords.chartAxes, 'note');
  build.row = FIRST - 1;
  build.formula(0, sheetCall('AXES', given), 'entry', {
    spill: { rows: count + 1, columns: 4, header: true, names: false },
  });
  head(4, [`X ${handoverWords.chartPlotted}`, `Y ${handoverWords.chartPlotted}`]);
  const mid = `MIN(${column(0, count)})`;
  plotted(4, (row) => `IF(ISNUMBER(${own(row, 0)}),${own(row, 0)},${mid})`, count);
  plotted(5, (row) => number(own(row, 1)), count);

  build.row = 1;
  build.text(7, handoverWords.chartLine, 'note');
  head(7, ['X', 'Y']);
  const line = (row: number, column_: number): string =>
    `INDEX(${sheetCall('LINE', given)},${row},${column_})`;
  const end = (pick: 'MIN' | 'MAX', row: number): void => {
    build.row = row;
    build.formula(7, `${pick}(${column(0, count)})`, 'entry');
    build.formula(
      8,
      form.proportional ? `${line(2, 2)}*${own(row, 7)}` : `${line(3, 2)}+${line(2, 2)}*${own(row, 7)}`,
      'entry',
    );
  };
  end('MIN', FIRST);
  end('MAX', FIRST + 1);
  const straight: PlannedChart = {
    title: handoverWords.straightTitle(form.plot, form.against),
    ...straightTitles(choice, fit),
    series: [
      { name: handoverWords.chartReadings, x: column(4, count), y: column(5, count), look: 'readings' },
      { name: handoverWords.chartLine, x: column(7, 2), y: column(8, 2), look: 'line' },
    ],
  };

  build.row = 1;
  build.text(10, handoverWords.chartReadings, 'note');
  head(10, [law.predictor, law.response]);
  const readingCell = (which: 'x' | 'y', row: number): string =>
    fixedPlace(cellAt(choice[which], row - FIRST + 1) ?? choice[which], corner.sheet);
  const both = (row: number): string =>
    `AND(ISNUMBER(${readingCell('x', row)}),ISNUMBER(${readingCell('y', row)}))`;
  plotted(10, (row) => `IF(${both(row)},${readingCell('x', row)},MIN(${given.x}))`, count);
  plotted(11, (row) => `IF(${both(row)},${readingCell('y', row)},NA())`, count);
  const charts = [straight];
  if (law.curve !== null) {
    build.row = 1;
    build.text(13, handoverWords.chartCurve, 'note');
    head(13, [
      law.predictor,
      law.response,
      `u(${law.response})`,
      handoverWords.chartLow,
      handoverWords.chartHigh,
    ]);
    const [low, high] = [`MIN(${column(10, count)})`, `MAX(${column(10, count)})`];
    plotted(13, (row) => `${low}+${row - FIRST}*(${high}-${low})/${CURVE_POINTS - 1}`, CURVE_POINTS);
    build.row = FIRST;
    const at = column(13, CURVE_POINTS);
    build.formula(14, sheetCall('Y.AT', given, [at]), 'entry', {
      spill: { rows: CURVE_POINTS, columns: 4, header: false, names: false },
    });
    head(
      18,
      [law.response, handoverWords.chartLow, handoverWords.chartHigh].map(
        (text) => `${text} ${handoverWords.chartPlotted}`,
      ),
    );
    [14, 16, 17].forEach((from, k) => {
      plotted(18 + k, (row) => number(own(row, from)), CURVE_POINTS);
    });
    const curve = (name: string, left: number, look: 'line' | 'band'): PlannedSeries => ({
      name,
      x: at,
      y: column(left, CURVE_POINTS),
      look,
    });
    const titles = curveTitles(choice, fit);
    charts.push({
      title: handoverWords.curveTitle(titles.yTitle, titles.xTitle),
      ...titles,
      series: [
        { name: handoverWords.chartReadings, x: column(10, count), y: column(11, count), look: 'readings' },
        curve(law.response, 18, 'line'),
        curve(handoverWords.chartLow, 19, 'band'),
        curve(handoverWords.chartHigh, 20, 'band'),
      ],
    });
  }
  const columns = law.curve === null ? 12 : 21;
  return {
    block: {
      cells: build.cells,
      rows: FIRST + Math.max(count, CURVE_POINTS),
      columns,
      widths: Array.from({ length: columns }, () => 84),
    },
    charts,
  };
}

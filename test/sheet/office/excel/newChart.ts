import type { AxisState, Book, ChartState, SeriesState } from '../book.ts';
import { invalidArgument } from '../hostError.ts';
import type { Place } from './place.ts';

const TYPES = [
  'XYScatter',
  'XYScatterLines',
  'XYScatterLinesNoMarkers',
  'XYScatterSmooth',
  'XYScatterSmoothNoMarkers',
  'Line',
  'LineMarkers',
];

/** A new chart of a range: its first column across, each further column a series, a header row naming them. */
export function newChart(
  book: Book,
  sheet: string,
  type: string,
  place: Place | null,
  seriesBy: string,
): ChartState {
  if (!TYPES.includes(type))
    throw invalidArgument(`ChartCollection.add: the stand-in draws ${TYPES.join(', ')}`);
  if (seriesBy === 'Rows')
    throw invalidArgument('ChartCollection.add: the stand-in takes series from columns');
  const id = book.id('chart');
  return {
    id,
    sheet,
    name: `Chart ${id.split('-')[1] ?? ''}`,
    chartType: type,
    title: '',
    titleVisible: true,
    legendVisible: true,
    legendPosition: 'Right',
    left: 60,
    top: 60,
    width: 360,
    height: 216,
    x: newAxis(),
    y: newAxis(),
    series: place ? seriesOf(book, place) : [],
    bag: {},
  };
}

function newAxis(): AxisState {
  return {
    title: '',
    titleVisible: false,
    minimum: null,
    maximum: null,
    logarithmic: false,
    gridlines: true,
    visible: true,
    numberFormat: 'General',
    bag: {},
  };
}

export function newSeries(book: Book, name: string | null): SeriesState {
  return {
    id: book.id('series'),
    name: name ?? '',
    nameGiven: name !== null,
    chartType: null,
    xSource: null,
    ySource: null,
    markerStyle: 'Automatic',
    markerSize: 5,
    markerColor: null,
    lineVisible: null,
    lineColor: null,
    lineWeight: 1.5,
    lineStyle: 'Continuous',
    bag: {},
  };
}

function seriesOf(book: Book, place: Place): SeriesState[] {
  const { sheet, rect } = place;
  const cell = (row: number, column: number) => book.grid.read(sheet, row, column).value;
  const hasHeader = typeof cell(rect.top, rect.right) === 'string';
  const top = hasHeader ? rect.top + 1 : rect.top;
  const source = (column: number) => ({
    sheet,
    rect: { top, left: column, bottom: rect.bottom, right: column },
  });
  const several = rect.right > rect.left;
  const columns = Array.from(
    { length: several ? rect.right - rect.left : 1 },
    (_, index) => rect.left + index + (several ? 1 : 0),
  );
  return columns.map((column) => {
    const header = hasHeader ? cell(rect.top, column) : null;
    const series = newSeries(book, typeof header === 'string' ? header : null);
    series.ySource = source(column);
    series.xSource = several ? source(rect.left) : null;
    return series;
  });
}

import type { AxisState, Book, ChartState } from '../book.ts';
import { invalidArgument } from '../hostError.ts';
import { type Definition, type Property, remoteBehind } from '../remote.ts';
import { asBoolean, asNumber, asText, POINTS_PER_PIXEL, remembered } from './arguments.ts';
import type { Place } from './place.ts';
import { placesOf } from './placesOf.ts';
import { rangePlace } from './range.ts';
import { seriesCollection } from './series.ts';
import { worksheet } from './worksheet.ts';

/** What a chart proxy stands for. */
export interface ChartTarget {
  readonly book: Book;
  readonly chart: ChartState;
}

interface AxisTarget extends ChartTarget {
  readonly axis: AxisState;
}

/** A property of a chart (or part of one) that redraws it when set. */
export function drawn<T extends ChartTarget>(
  get: (target: T) => unknown,
  put: (target: T, value: unknown) => void,
): Property<T> {
  return {
    get,
    set: (target, value) => {
      put(target, value);
      target.book.draw(target.chart);
    },
  };
}

const measure = (key: 'left' | 'top' | 'width' | 'height') =>
  drawn<ChartTarget>(
    ({ chart: state }) => state[key],
    ({ chart: state }, value) => {
      state[key] = asNumber(value, `Chart.${key}`);
    },
  );

/** Text formats of charts are remembered, not drawn. */
const textFormat: Definition<ChartTarget & { key: string }> = {
  type: 'ChartTextFormat',
  links: {
    font: (self) =>
      self.child(
        {
          type: 'ChartFont',
          properties: remembered<ChartTarget & { key: string }>(
            { bold: false, italic: false, color: '#000000', size: 10, name: 'Arial', underline: 'None' },
            (target) => target.book.bag(`${target.chart.id}/${target.key}`),
          ),
        },
        (target) => target,
        false,
      ),
  },
};

const title: Definition<ChartTarget> = {
  type: 'ChartTitle',
  properties: {
    text: drawn(
      ({ chart: state }) => state.title,
      ({ chart: state }, value) => {
        state.title = asText(value, 'ChartTitle.text');
        state.titleVisible = true;
      },
    ),
    visible: drawn(
      ({ chart: state }) => state.titleVisible,
      ({ chart: state }, value) => {
        state.titleVisible = asBoolean(value, 'ChartTitle.visible');
      },
    ),
    ...remembered<ChartTarget>({ overlay: false, position: 'Automatic' }, ({ chart: state }) => state.bag),
  },
  links: { format: (self) => self.child(textFormat, (target) => ({ ...target, key: 'title' }), false) },
};

const legend: Definition<ChartTarget> = {
  type: 'ChartLegend',
  properties: {
    visible: drawn(
      ({ chart: state }) => state.legendVisible,
      ({ chart: state }, value) => {
        state.legendVisible = asBoolean(value, 'ChartLegend.visible');
      },
    ),
    position: drawn(
      ({ chart: state }) => state.legendPosition,
      ({ chart: state }, value) => {
        state.legendPosition = asText(value, 'ChartLegend.position');
      },
    ),
    ...remembered<ChartTarget>({ overlay: false }, ({ chart: state }) => state.bag),
  },
  links: { format: (self) => self.child(textFormat, (target) => ({ ...target, key: 'legend' }), false) },
};

const axisTitle: Definition<AxisTarget> = {
  type: 'ChartAxisTitle',
  properties: {
    text: drawn(
      ({ axis: state }) => state.title,
      ({ axis: state }, value) => {
        state.title = asText(value, 'ChartAxisTitle.text');
        state.titleVisible = true;
      },
    ),
    visible: drawn(
      ({ axis: state }) => state.titleVisible,
      ({ axis: state }, value) => {
        state.titleVisible = asBoolean(value, 'ChartAxisTitle.visible');
      },
    ),
  },
  links: { format: (self) => self.child(textFormat, (target) => ({ ...target, key: 'axis title' }), false) },
};

const gridlines = (key: 'major' | 'minor'): Definition<AxisTarget> => ({
  type: 'ChartGridlines',
  properties: {
    visible: drawn(
      ({ axis: state }) => (key === 'major' ? state.gridlines : (state.bag['minor'] ?? false)),
      ({ axis: state }, value) => {
        const shown = asBoolean(value, 'ChartGridlines.visible');
        if (key === 'major') state.gridlines = shown;
        else state.bag['minor'] = shown;
      },
    ),
  },
  links: {
    format: (self) =>
      self.child(
        {
          type: 'ChartGridlinesFormat',
          links: {
            line: (format) =>
              format.child(
                {
                  type: 'ChartLineFormat',
                  properties: remembered<AxisTarget>(
                    { color: '#D9D9D9', lineStyle: 'Continuous', weight: 0.75 },
                    ({ axis: state }) => state.bag,
                  ),
                },
                (target) => target,
                false,
              ),
          },
        } satisfies Definition<AxisTarget>,
        (target) => target,
        false,
      ),
  },
});

const limit = (key: 'minimum' | 'maximum') =>
  drawn<AxisTarget>(
    ({ axis: state }) => state[key] ?? '',
    ({ axis: state }, value) => {
      state[key] = value === '' || value === null ? null : asNumber(value, `ChartAxis.${key}`);
    },
  );

const axis: Definition<AxisTarget> = {
  type: 'ChartAxis',
  properties: {
    minimum: limit('minimum'),
    maximum: limit('maximum'),
    scaleType: drawn(
      ({ axis: state }) => (state.logarithmic ? 'Logarithmic' : 'Linear'),
      ({ axis: state }, value) => {
        if (value !== 'Linear' && value !== 'Logarithmic') throw invalidArgument('ChartAxis.scaleType');
        state.logarithmic = value === 'Logarithmic';
      },
    ),
    visible: drawn(
      ({ axis: state }) => state.visible,
      ({ axis: state }, value) => {
        state.visible = asBoolean(value, 'ChartAxis.visible');
      },
    ),
    numberFormat: drawn(
      ({ axis: state }) => state.numberFormat,
      ({ axis: state }, value) => {
        state.numberFormat = asText(value, 'ChartAxis.numberFormat');
      },
    ),
    ...remembered<AxisTarget>(
      {
        logBase: 10,
        majorUnit: '',
        minorUnit: '',
        position: 'Automatic',
        tickLabelPosition: 'NextToAxis',
        majorTickMark: 'Outside',
        minorTickMark: 'None',
        linkNumberFormat: true,
      },
      ({ axis: state }) => state.bag,
    ),
  },
  links: {
    title: (self) => self.child(axisTitle, (target) => target, false),
    majorGridlines: (self) => self.child(gridlines('major'), (target) => target, false),
    minorGridlines: (self) => self.child(gridlines('minor'), (target) => target, false),
    format: (self) => self.child(textFormat, (target) => ({ ...target, key: 'axis' }), false),
  },
  methods: {
    setPositionAt: (self, value) =>
      self.act('setPositionAt', ({ axis: state }) => {
        state.bag['positionAt'] = asNumber(value, 'ChartAxis.setPositionAt');
      }),
  },
};

const axes: Definition<ChartTarget> = {
  type: 'ChartAxes',
  links: {
    categoryAxis: (self) => self.child(axis, (target) => ({ ...target, axis: target.chart.x }), false),
    valueAxis: (self) => self.child(axis, (target) => ({ ...target, axis: target.chart.y }), false),
  },
};

export const chart: Definition<ChartTarget> = {
  type: 'Chart',
  properties: {
    id: { get: (target) => target.chart.id },
    name: {
      get: (target) => target.chart.name,
      set: (target, value) => {
        target.chart.name = asText(value, 'Chart.name');
      },
    },
    chartType: drawn(
      (target) => target.chart.chartType,
      (target, value) => {
        target.chart.chartType = asText(value, 'Chart.chartType');
      },
    ),
    left: measure('left'),
    top: measure('top'),
    width: measure('width'),
    height: measure('height'),
    ...remembered<ChartTarget>(
      { plotVisibleOnly: true, displayBlanksAs: 'NotPlotted', style: 2 },
      (target) => target.chart.bag,
    ),
  },
  links: {
    title: (self) => self.child(title, (target) => target, false),
    legend: (self) => self.child(legend, (target) => target, false),
    axes: (self) => self.child(axes, (target) => target, false),
    series: (self) => self.child(seriesCollection, (target) => target, false),
    worksheet: (self) =>
      self.child(worksheet, (target) => ({ book: target.book, sheet: target.chart.sheet }), false),
  },
  methods: {
    delete: (self) => self.act('delete', (target) => target.book.undraw(target.chart)),
    activate: (self) => self.act('activate', () => undefined),
    setPosition: (self, start, end) => {
      const behind = [start, end].map(remoteBehind);
      self.act('setPosition', (target) => {
        const corner = (index: 0 | 1): Place => {
          const remote = behind[index];
          if (remote) return rangePlace(remote);
          const given = [start, end ?? start][index];
          const on = { book: target.book, sheet: target.chart.sheet };
          return placesOf(on, asText(given, 'Chart.setPosition'), 'Chart.setPosition')[0] ?? notThere();
        };
        place(target, corner(0), end === undefined ? null : corner(1));
      });
    },
  },
};

function notThere(): never {
  throw invalidArgument('Chart.setPosition');
}

function place(target: ChartTarget, start: Place, end: Place | null): void {
  const { book, chart: state } = target;
  const across = (column: number) => book.grid.columnWidth(state.sheet, column) * POINTS_PER_PIXEL;
  const down = (row: number) => book.grid.rowHeight(state.sheet, row) * POINTS_PER_PIXEL;
  const sum = (from: number, to: number, size: (index: number) => number) => {
    let total = 0;
    for (let index = from; index < to; index++) total += size(index);
    return total;
  };
  state.left = sum(0, start.rect.left, across);
  state.top = sum(0, start.rect.top, down);
  if (end) {
    state.width = sum(start.rect.left, end.rect.right + 1, across);
    state.height = sum(start.rect.top, end.rect.bottom + 1, down);
  }
  book.draw(state);
}

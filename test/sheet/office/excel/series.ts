import type { SeriesState } from '../book.ts';
import { invalidArgument, itemNotFound } from '../hostError.ts';
import { type Definition, member, type Remote, remoteBehind } from '../remote.ts';
import { asNumber, asText, remembered } from './arguments.ts';
import { type ChartTarget, drawn } from './chart.ts';
import { newSeries } from './newChart.ts';
import { rangePlace } from './range.ts';

export interface SeriesTarget extends ChartTarget {
  readonly series: SeriesState;
}

const line: Definition<SeriesTarget> = {
  type: 'ChartLineFormat',
  properties: {
    color: drawn(
      ({ series: state }) => state.lineColor ?? '',
      ({ series: state }, value) => {
        state.lineColor = asText(value, 'ChartLineFormat.color');
        state.lineVisible = true;
      },
    ),
    weight: drawn(
      ({ series: state }) => state.lineWeight,
      ({ series: state }, value) => {
        state.lineWeight = asNumber(value, 'ChartLineFormat.weight');
      },
    ),
    lineStyle: drawn(
      ({ series: state }) => state.lineStyle,
      ({ series: state }, value) => {
        state.lineStyle = asText(value, 'ChartLineFormat.lineStyle');
        state.lineVisible = value !== 'None';
      },
    ),
  },
  methods: {
    clear: (self) =>
      self.act('clear', ({ book, chart, series: state }) => {
        state.lineVisible = false;
        book.draw(chart);
      }),
  },
};

const fill: Definition<SeriesTarget> = {
  type: 'ChartFill',
  methods: {
    setSolidColor: (self, color) =>
      self.act('setSolidColor', ({ book, chart, series: state }) => {
        state.markerColor = asText(color, 'ChartFill.setSolidColor');
        book.draw(chart);
      }),
    clear: (self) => self.act('clear', () => undefined),
  },
};

const format: Definition<SeriesTarget> = {
  type: 'ChartSeriesFormat',
  links: {
    line: (self) => self.child(line, (target) => target, false),
    fill: (self) => self.child(fill, (target) => target, false),
  },
};

function setSource(
  self: Remote<SeriesTarget>,
  key: 'xSource' | 'ySource',
  given: unknown,
  name: string,
): void {
  const behind = remoteBehind(given);
  if (!behind) throw invalidArgument(`ChartSeries.${name}`);
  self.act(name, ({ book, chart, series: state }) => {
    const { sheet, rect } = rangePlace(behind);
    state[key] = { sheet, rect };
    book.draw(chart);
  });
}

const series: Definition<SeriesTarget> = {
  type: 'ChartSeries',
  properties: {
    name: drawn(
      ({ series: state }) => state.name,
      ({ series: state }, value) => {
        state.name = asText(value, 'ChartSeries.name');
        state.nameGiven = true;
      },
    ),
    chartType: drawn(
      ({ chart, series: state }) => state.chartType ?? chart.chartType,
      ({ series: state }, value) => {
        state.chartType = asText(value, 'ChartSeries.chartType');
      },
    ),
    markerStyle: drawn(
      ({ series: state }) => state.markerStyle,
      ({ series: state }, value) => {
        state.markerStyle = asText(value, 'ChartSeries.markerStyle');
      },
    ),
    markerSize: drawn(
      ({ series: state }) => state.markerSize,
      ({ series: state }, value) => {
        state.markerSize = asNumber(value, 'ChartSeries.markerSize');
      },
    ),
    markerBackgroundColor: drawn(
      ({ series: state }) => state.markerColor ?? '',
      ({ series: state }, value) => {
        state.markerColor = asText(value, 'ChartSeries.markerBackgroundColor');
      },
    ),
    markerForegroundColor: drawn(
      ({ series: state }) => state.markerColor ?? '',
      ({ series: state }, value) => {
        state.markerColor = asText(value, 'ChartSeries.markerForegroundColor');
      },
    ),
    ...remembered<SeriesTarget>(
      { smooth: false, axisGroup: 'Primary', hasDataLabels: false, showShadow: false, plotOrder: 0 },
      ({ series: state }) => state.bag,
    ),
  },
  links: { format: (self) => self.child(format, (target) => target, false) },
  methods: {
    setValues: (self, given) => setSource(self, 'ySource', given, 'setValues'),
    setXAxisValues: (self, given) => setSource(self, 'xSource', given, 'setXAxisValues'),
    delete: (self) =>
      self.act('delete', ({ book, chart, series: state }) => {
        chart.series.splice(chart.series.indexOf(state), 1);
        book.draw(chart);
      }),
  },
};

const found = (target: ChartTarget, index: unknown): SeriesTarget => {
  const state = target.chart.series[Number(index)];
  if (!state) throw itemNotFound('ChartSeriesCollection.getItemAt');
  return { ...target, series: state };
};

export const seriesCollection: Definition<ChartTarget> = {
  type: 'ChartSeriesCollection',
  properties: { count: { get: ({ chart }) => chart.series.length } },
  items: {
    list: (self, target) =>
      target.chart.series.map((state) => member(self.context, series, { ...target, series: state })),
  },
  methods: {
    add: (self, name) =>
      self.child(series, (target) => {
        const state = newSeries(
          target.book,
          name === undefined || name === null ? null : asText(name, 'add'),
        );
        target.chart.series.push(state);
        target.book.draw(target.chart);
        return { ...target, series: state };
      }),
    getItemAt: (self, index) => self.child(series, (target) => found(target, index)),
    getCount: (self) => self.ask('getCount', ({ chart }) => chart.series.length),
  },
};

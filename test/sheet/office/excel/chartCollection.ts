import type { Book, ChartState } from '../book.ts';
import { itemNotFound } from '../hostError.ts';
import { type Definition, member, remoteBehind } from '../remote.ts';
import { asText } from './arguments.ts';
import { type ChartTarget, chart } from './chart.ts';
import { newChart } from './newChart.ts';
import { rangePlace } from './range.ts';

interface SheetOfCharts {
  readonly book: Book;
  readonly sheet: string;
}

const present = ({ book, sheet }: SheetOfCharts): ChartTarget[] =>
  book.charts.filter((one) => one.sheet === sheet).map((one) => ({ book, chart: one }));

const find = (target: SheetOfCharts, key: unknown): ChartTarget | null =>
  present(target).find((one) => one.chart.name === key || one.chart.id === key) ?? null;

const missing = (): never => {
  throw itemNotFound('ChartCollection.getItem');
};

export const chartCollection: Definition<SheetOfCharts> = {
  type: 'ChartCollection',
  properties: { count: { get: (target) => present(target).length } },
  items: { list: (self, target) => present(target).map((one) => member(self.context, chart, one)) },
  methods: {
    add: (self, type, source, seriesBy = 'Auto') => {
      const behind = remoteBehind(source);
      return self.child(chart, ({ book, sheet }) => {
        const place = behind ? rangePlace(behind) : null;
        const state: ChartState = newChart(
          book,
          sheet,
          asText(type, 'ChartCollection.add'),
          place,
          String(seriesBy),
        );
        book.charts.push(state);
        book.draw(state);
        return { book, chart: state };
      });
    },
    getItem: (self, key) => self.child(chart, (target) => find(target, key) ?? missing()),
    getItemOrNullObject: (self, key) => self.child(chart, (target) => find(target, key)),
    getItemAt: (self, index) => self.child(chart, (target) => present(target)[Number(index)] ?? missing()),
    getCount: (self) => self.ask('getCount', (target) => present(target).length),
  },
};

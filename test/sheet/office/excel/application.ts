import type { Book } from '../book.ts';
import type { Definition } from '../remote.ts';
import { remembered } from './arguments.ts';

const bag = ({ book }: { book: Book }) => book.bag('application');

const numberFormatInfo: Definition<{ book: Book }> = {
  type: 'NumberFormatInfo',
  properties: { numberDecimalSeparator: { get: () => '.' }, numberGroupSeparator: { get: () => ',' } },
};

const cultureInfo: Definition<{ book: Book }> = {
  type: 'CultureInfo',
  properties: { name: { get: () => 'en-US' } },
  links: { numberFormat: (self) => self.child(numberFormatInfo, (target) => target, false) },
};

export const application: Definition<{ book: Book }> = {
  type: 'Application',
  properties: {
    ...remembered<{ book: Book }>({ calculationMode: 'Automatic', useSystemSeparators: true }, bag),
    calculationState: { get: () => 'Done' },
    decimalSeparator: { get: () => '.' },
    thousandsSeparator: { get: () => ',' },
    calculationEngineVersion: { get: () => 191029 },
  },
  links: { cultureInfo: (self) => self.child(cultureInfo, (target) => target, false) },
  methods: {
    calculate: (self) => self.act('calculate', ({ book }) => book.grid.recalculate(), true),
    // Writes of one batch are calculated together in any case.
    suspendApiCalculationUntilNextSync: (self) =>
      self.act('suspendApiCalculationUntilNextSync', () => undefined),
    suspendScreenUpdatingUntilNextSync: (self) =>
      self.act('suspendScreenUpdatingUntilNextSync', () => undefined),
  },
};

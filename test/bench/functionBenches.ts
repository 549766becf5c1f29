import { Matrix, solve } from 'ml-matrix';
import { type Cells, hostFunction } from '../hostCalls.ts';
import { bareLoop } from './bareLoop.ts';
import { decayReadings, seeded, typeReading } from './readingsToTime.ts';
import { type Row, timeText } from './row.ts';
import { time } from './timing.ts';

const LAW = 'exponential';
/** The host's last argument. */
const INVOCATION = {};

const line = hostFunction('LINE');
const sizeOf = (count: number): string => `${count.toLocaleString('en')} readings`;

/** The same line by general least squares, from the same cells. */
function generalLeastSquares(x: Cells, y: Cells): number {
  const design = new Matrix(x.length, 2);
  const vertical = new Matrix(x.length, 1);
  for (let i = 0; i < x.length; i++) {
    design.set(i, 0, 1);
    design.set(i, 1, Number(x[i]?.[0]));
    vertical.set(i, 0, Math.log(Number(y[i]?.[0])));
  }
  return solve(design, vertical).get(1, 0);
}

/** LINE against the bare loop and against general least squares, and how its time grows. */
export async function lineBenches(): Promise<Row[]> {
  const rows: Row[] = [];
  const took: number[] = [];
  const bare: number[] = [];
  for (const count of [100, 10_000, 100_000]) {
    const { x, y } = decayReadings(count);
    const withTyping =
      <T>(run: () => T) =>
      () => {
        typeReading(y);
        return run();
      };
    const times = await time({
      bare: withTyping(() => bareLoop(x, y)),
      line: withTyping(() => line(x, y, LAW, INVOCATION)),
    });
    const { general } = await time({ general: withTyping(() => generalLeastSquares(x, y)) });
    took.push(times.line);
    bare.push(times.bare);
    rows.push({
      what: 'LINE, a reading typed anew each time',
      size: sizeOf(count),
      time: timeText(times.line),
      against: `bare loop: the same cells and logarithms, summed (${timeText(times.bare)})`,
      ratio: times.line / times.bare,
      target: { atMost: 4 },
    });
    rows.push({
      what: 'LINE',
      size: sizeOf(count),
      time: timeText(times.line),
      against: `general least squares of ml-matrix (${timeText(general)})`,
      ratio: times.line / general,
      target: { atLeastFaster: 10 },
    });
  }
  const growth = ([, middle = Number.NaN, most = Number.NaN]: readonly number[]): number => most / middle;
  rows.push({
    what: 'LINE, growth',
    size: '10,000 → 100,000',
    time: timeText(took[2] ?? Number.NaN),
    against: `a tenth of the readings (the bare loop grows ${growth(bare).toFixed(1)} times)`,
    ratio: growth(took),
    target: { atMost: 11 },
  });
  return rows;
}

/** COMPARE of the general laws against one LINE. */
export async function compareBenches(): Promise<Row[]> {
  const compare = hostFunction('COMPARE');
  const rows: Row[] = [];
  for (const count of [100, 10_000]) {
    const { x, y } = decayReadings(count);
    const times = await time({
      line: () => {
        typeReading(y);
        return line(x, y, LAW, INVOCATION);
      },
      compare: () => {
        typeReading(y);
        return compare(x, y, null, INVOCATION);
      },
    });
    rows.push({
      what: 'COMPARE, the eleven general laws',
      size: sizeOf(count),
      time: timeText(times.compare),
      against: `one LINE (${timeText(times.line)})`,
      ratio: times.compare / times.line,
      target: { atMost: 9 },
    });
  }
  return rows;
}

/** EACH on many short series against the bare loop over the same cells. */
export async function eachBench(): Promise<Row[]> {
  const each = hostFunction('EACH');
  const [series, length] = [5_000, 20];
  const random = seeded(7);
  const key: Cells = [];
  const x: Cells = [];
  const y: Cells = [];
  for (let s = 0; s < series; s++) {
    const rate = 0.1 + random();
    for (let i = 0; i < length; i++) {
      key.push([`bottle ${s}`]);
      x.push([0.5 * i]);
      y.push([2 * Math.exp(-rate * 0.5 * i) * (1 + 0.04 * (random() - 0.5))]);
    }
  }
  const times = await time(
    {
      bare: () => {
        typeReading(y);
        return bareLoop(x, y);
      },
      each: () => {
        typeReading(y);
        return each(key, x, y, LAW, INVOCATION);
      },
    },
    300,
  );
  return [
    {
      what: 'EACH',
      size: '5,000 series × 20',
      time: timeText(times.each),
      against: `bare loop over the same cells (${timeText(times.bare)})`,
      ratio: times.each / times.bare,
      target: { atMost: 10 },
    },
  ];
}

/** Fifteen functions that say something of one fit, as a careful sheet has them, against the first alone. */
export async function fifteenBench(): Promise<Row[]> {
  const { x, y } = decayReadings(10_000);
  const calls: readonly (() => unknown)[] = [
    () => hostFunctionCall('CONSTANTS', x, y, LAW),
    () => hostFunctionCall('LINE', x, y, LAW),
    ...['p', 'q', 'time constant', 'half-life'].flatMap((name) => [
      () => hostFunctionCall('CONSTANT', x, y, LAW, name),
      () => hostFunctionCall('CONSTANT', x, y, LAW, name, 'u'),
    ]),
    () => hostFunctionCall('CONSTANT', x, y, LAW, 'q', 'low'),
    () => hostFunctionCall('CONSTANT', x, y, LAW, 'q', 'high'),
    () => hostFunctionCall('STATEMENT', x, y, LAW, 'q', '1/h'),
    () => hostFunctionCall('Y.AT', x, y, LAW, [[5], [12]]),
    () => hostFunctionCall('X.AT', x, y, LAW, [[0.2]]),
  ];
  const times = await time({
    one: () => {
      typeReading(y);
      return calls[0]?.();
    },
    fifteen: () => {
      typeReading(y);
      for (const call of calls) call();
    },
  });
  return [
    {
      what: `${calls.length} functions on one range`,
      size: sizeOf(x.length),
      time: timeText(times.fifteen),
      against: `one of them, CONSTANTS (${timeText(times.one)})`,
      ratio: times.fifteen / times.one,
      target: { atMost: 2 },
    },
  ];
}

function hostFunctionCall(id: string, ...given: unknown[]): unknown {
  return hostFunction(id)(...given, INVOCATION);
}

/** A law in the user's own symbols, made straight from its text; new symbols each time, so that none is remembered. */
export async function straightenBench(): Promise<Row[]> {
  const straighten = hostFunction('STRAIGHTEN');
  let serial = 0;
  const laws: Readonly<Record<string, (n: number) => string>> = {
    'V(t) = V0*exp(-t/tau)': (n) => `V(t) = V0*exp(-t/tau${n})`,
    'q(c) = qm*K*c/(1 + K*c)': (n) => `q(c) = qm*K${n}*c/(1 + K${n}*c)`,
    'Q(h) = c*(h - h0)^b': (n) => `Q(h) = c*(h - h${n})^b`,
  };
  const times = await time(
    Object.fromEntries(
      Object.entries(laws).map(([text, law]) => [text, () => straighten(law(++serial), null, INVOCATION)]),
    ),
  );
  return Object.keys(laws).map((text) => ({
    what: `STRAIGHTEN \`${text}\`, from text`,
    size: 'one law',
    time: timeText(times[text] ?? Number.NaN),
    against: '',
  }));
}

/** What keeps the page busy for longest at a stretch. */
export async function stretchBench(): Promise<Row[]> {
  const { x, y } = decayReadings(100_000);
  const laws = { COMPARE: null, CHECKS: LAW, STRAIGHTNESS: LAW, RESIDUALS: LAW, AXES: LAW };
  const tasks = Object.fromEntries(
    Object.entries(laws).map(([id, law]) => [
      id,
      () => {
        typeReading(y);
        return hostFunctionCall(id, x, y, law);
      },
    ]),
  );
  const times = await time(tasks, 200);
  return Object.keys(laws).map((id) => ({
    what: `${id}, at a stretch`,
    size: sizeOf(x.length),
    time: timeText(times[id] ?? Number.NaN),
    against: '100 ms',
    ratio: (times[id] ?? Number.NaN) / 100,
    target: { atMost: 1 },
  }));
}

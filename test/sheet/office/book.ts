import type { Rect } from '../grid/address.ts';
import type { Grid } from '../grid/grid.ts';

/** Where settings are kept between one opening of the workbook and the next. */
export interface SettingsStore {
  read(): Record<string, unknown>;
  write(settings: Record<string, unknown>): void;
}

/** What an axis of a chart is told to look like. */
export interface AxisState {
  title: string;
  titleVisible: boolean;
  minimum: number | null;
  maximum: number | null;
  logarithmic: boolean;
  gridlines: boolean;
  visible: boolean;
  numberFormat: string;
  bag: Record<string, unknown>;
}

export interface SeriesState {
  id: string;
  name: string;
  nameGiven: boolean;
  chartType: string | null;
  xSource: { sheet: string; rect: Rect } | null;
  ySource: { sheet: string; rect: Rect } | null;
  markerStyle: string;
  markerSize: number;
  markerColor: string | null;
  lineVisible: boolean | null;
  lineColor: string | null;
  lineWeight: number;
  lineStyle: string;
  bag: Record<string, unknown>;
}

export interface ChartState {
  readonly id: string;
  sheet: string;
  name: string;
  chartType: string;
  title: string;
  titleVisible: boolean;
  legendVisible: boolean;
  legendPosition: string;
  left: number;
  top: number;
  width: number;
  height: number;
  readonly x: AxisState;
  readonly y: AxisState;
  readonly series: SeriesState[];
  bag: Record<string, unknown>;
}

export interface TableState {
  readonly id: string;
  name: string;
  sheet: string;
  rect: Rect;
  showHeaders: boolean;
  bag: Record<string, unknown>;
}

export interface ShapeState {
  readonly id: string;
  readonly sheet: string;
  name: string;
  source: string;
  left: number;
  top: number;
  width: number;
  height: number;
  bag: Record<string, unknown>;
}

interface Fault {
  readonly at: RegExp;
  readonly code: string;
  readonly message: string;
  times: number;
}

/** The workbook as the host's object model sees it: the grid and what the grid knows nothing of. */
export class Book {
  readonly grid: Grid;
  readonly charts: ChartState[] = [];
  readonly tables: TableState[] = [];
  readonly shapes: ShapeState[] = [];
  readonly protectedSheets = new Set<string>();
  readonly bags = new Map<string, Record<string, unknown>>();
  readonly settings: Map<string, unknown>;
  /** How long a round trip to the host takes, in milliseconds. */
  latency = 0;
  /** Whether what changes now is another person's doing. */
  coauthoring = false;
  private readonly store: SettingsStore;
  private readonly faults: Fault[] = [];
  private readonly drawers = new Set<(chart: ChartState, shown: boolean) => void>();
  private readonly pageSubscriptions = new Set<() => void>();
  private serial = 0;

  constructor(grid: Grid, store: SettingsStore) {
    this.grid = grid;
    this.store = store;
    this.settings = new Map(Object.entries(store.read()));
    grid.listen((event) => {
      if (event.type === 'edited' && event.source === 'user') this.growTables(event.sheet, event.rect);
      if (event.type === 'edited' || event.type === 'calculated') this.redrawCharts();
      if (event.type === 'deleted') this.forgetSheet(event.sheet);
    });
  }

  id(prefix: string): string {
    this.serial++;
    return `${prefix}-${this.serial}`;
  }

  keepSettings(): void {
    this.store.write(Object.fromEntries(this.settings));
  }

  bag(key: string): Record<string, unknown> {
    const bag = this.bags.get(key) ?? {};
    this.bags.set(key, bag);
    return bag;
  }

  /** Makes the next step whose name matches (`sync`, `Range.values=`, `Worksheet.load` …) fail with this error. */
  failNext(code: string, message: string, at = /^sync$/, times = 1): void {
    this.faults.push({ at, code, message, times });
  }

  /** Forgets the faults that were asked for. */
  stopFailing(): void {
    this.faults.length = 0;
  }

  /** Changes the sheet as another person who has the workbook open. */
  asCoauthor(edit: (grid: Grid) => void): void {
    this.coauthoring = true;
    try {
      edit(this.grid);
    } finally {
      this.coauthoring = false;
    }
  }

  /** The fault that was asked for at a step, once; the page that runs the step raises it as an error of its own. */
  takeFault(step: string): Pick<Fault, 'code' | 'message'> | undefined {
    const fault = this.faults.find((one) => one.times > 0 && one.at.test(step));
    if (fault) fault.times--;
    return fault;
  }

  /** A batch leaves the page's turn of the event loop, as it does on a host. */
  roundTrip(): Promise<void> {
    return new Promise((resolve) => setTimeout(resolve, this.latency));
  }

  later(call: () => unknown): void {
    setTimeout(() => {
      // An exception in a handler is the add-in's own affair on a host too: it reaches the console, nothing else.
      Promise.resolve()
        .then(call)
        .catch((reason: unknown) => console.error(reason));
    }, this.latency);
  }

  untilPageCloses(end: () => void): () => void {
    this.pageSubscriptions.add(end);
    return () => {
      this.pageSubscriptions.delete(end);
      end();
    };
  }

  /** Ends every subscription of the add-in's page, as when the host restarts it. */
  closePage(): void {
    for (const end of this.pageSubscriptions) end();
    this.pageSubscriptions.clear();
  }

  onDraw(drawer: (chart: ChartState, shown: boolean) => void): void {
    this.drawers.add(drawer);
  }

  draw(chart: ChartState): void {
    for (const drawer of this.drawers) drawer(chart, true);
  }

  undraw(chart: ChartState): void {
    const at = this.charts.indexOf(chart);
    if (at >= 0) this.charts.splice(at, 1);
    for (const drawer of this.drawers) drawer(chart, false);
  }

  private redrawCharts(): void {
    for (const chart of this.charts) this.draw(chart);
  }

  /** Typing right under a table makes it one row longer. */
  private growTables(sheet: string, rect: Rect): void {
    for (const table of this.tables) {
      const under = table.sheet === sheet && rect.top === table.rect.bottom + 1;
      const within = rect.left >= table.rect.left && rect.right <= table.rect.right;
      if (under && within) table.rect = { ...table.rect, bottom: rect.bottom };
    }
  }

  private forgetSheet(sheet: string): void {
    for (const chart of this.charts.filter((one) => one.sheet === sheet)) this.undraw(chart);
    remove(this.tables, sheet);
    remove(this.shapes, sheet);
    this.protectedSheets.delete(sheet);
  }
}

function remove(list: { sheet: string }[], sheet: string): void {
  for (let index = list.length - 1; index >= 0; index--) {
    if (list[index]?.sheet === sheet) list.splice(index, 1);
  }
}

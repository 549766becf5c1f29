import { Problem } from '../../core/problem.ts';
import { hostWords, panelWords, readingsWords, stepWords } from '../../core/words/panelWords.ts';
import { parseBlock, splitAddress } from '../host/address.ts';
import { type CellChange, HostTrouble, type Workbook } from '../host/workbook.ts';
import { cellsOfReading } from './cellOfReading.ts';
import { losesSpread, withReadings } from './changes.ts';
import type { Choice, Place } from './choice.ts';
import { createComputer } from './computer.ts';
import { growthAfter, withPlaces } from './growth.ts';
import { advance, type History, mapHistory, redo, startHistory, undo } from './history.ts';
import { moveChoice, renameSheet } from './movePlace.ts';
import { hasReadings } from './noChoice.ts';
import { initialState, type PanelState, type Selected } from './panelState.ts';
import { loadChoice, saveChoice } from './savedChoice.ts';
import { cellsAreOf, readSheetCells, sameCells } from './sheetCells.ts';
import { createStore, type Store } from './store.ts';
import { takeSelection } from './takeSelection.ts';

const SETTING = 'tautline.panel';
/** Changes within this time, in milliseconds, are saved, or read from the sheet, once. */
const SETTLE = 150;

/** What a view may ask for. */
export interface Session {
  readonly store: Store<PanelState>;
  readonly workbook: Workbook;
  /** Makes a step that can be taken back. */
  change(what: string, next: (choice: Choice) => Choice, mark?: string): void;
  takeSelection(): Promise<void>;
  /** The place that is selected in the sheet, for another input. */
  selectedPlace(): Promise<Place | undefined>;
  /** Checks a typed range. @throws HostTrouble */
  placeFrom(text: string): Promise<Place>;
  undo(): void;
  redo(): void;
  pick(position: number | null): void;
  showReading(position: number): Promise<void>;
  readAgain(): void;
  compareAgain(): void;
  cancel(): void;
  say(text: string): void;
  warn(error: unknown): void;
  dismiss(): void;
  close(): void;
}

/** Holds together what was chosen, what stands in the cells and what follows from both. */
export function createSession(workbook: Workbook): Session {
  const store = createStore<PanelState>(initialState);
  const computer = createComputer(store, (error) => warn(error));
  const ends: (() => void)[] = [];
  let saved = '';
  let reading: Promise<void> | null = null;
  let readOnceMore = false;
  const timers = new Map<string, ReturnType<typeof setTimeout>>();

  const choice = (): Choice => store.get().history.present;

  const later = (name: string, call: () => unknown): void => {
    // What was asked for before is still to come, and will find everything as it is then.
    if (timers.has(name)) return;
    const run = (): void => {
      timers.delete(name);
      Promise.resolve().then(call).catch(warn);
    };
    timers.set(name, setTimeout(run, SETTLE));
  };

  function warn(error: unknown): void {
    if (error instanceof HostTrouble) {
      store.set({ notice: { tone: 'stop', text: error.message, trouble: error.kind } });
    } else if (error instanceof Problem) {
      store.set({ notice: { tone: 'stop', text: error.message } });
    } else {
      const detail = error instanceof Error ? error.message : String(error);
      console.error(error);
      store.set({ notice: { tone: 'stop', text: panelWords.fault(detail) } });
    }
  }

  async function save(): Promise<void> {
    const text = saveChoice(choice());
    if (text === saved) return;
    await workbook.saveSetting(SETTING, text);
    saved = text;
  }

  /** Takes a new history as it is and lets everything follow. */
  function enter(history: History<Choice>, said = ''): void {
    store.set({ history, ...(said === '' ? {} : { said }) });
    later('save', save);
    if (!hasReadings(history.present)) {
      computer.stop();
      store.set({ cells: null, readings: null, cards: [], depth: null, picked: null });
      return;
    }
    if (cellsAreOf(store.get().cells, history.present)) computer.compute();
    else void read();
  }

  /** Reads the cells; asked again meanwhile, it reads once more at the end. */
  function read(): Promise<void> {
    readOnceMore = reading !== null;
    reading ??= readUntilSettled().finally(() => {
      reading = null;
    });
    return reading;
  }

  async function readUntilSettled(): Promise<void> {
    try {
      do {
        readOnceMore = false;
        if (!hasReadings(choice())) return;
        await followRenaming();
        const cells = await readSheetCells(workbook, choice());
        // Another choice was made while the cells were on their way.
        if (!cellsAreOf(cells, choice())) {
          readOnceMore = true;
          continue;
        }
        const { notice } = store.get();
        const recovered = notice?.trouble !== undefined ? { notice: null } : {};
        if (!sameCells(store.get().cells, cells)) {
          store.set({ cells, ...recovered });
          computer.compute();
        } else if (notice?.trouble !== undefined) store.set(recovered);
      } while (readOnceMore);
    } catch (error) {
      warn(error);
    }
  }

  /** A sheet may have another name than when it was chosen. */
  async function followRenaming(): Promise<void> {
    const before = choice();
    const [x, y] = await Promise.all([workbook.locate(before.x), workbook.locate(before.y)]);
    for (const [was, is] of [
      [before.x.sheet, x.sheet],
      [before.y.sheet, y.sheet],
    ] as const) {
      if (was === is) continue;
      store.set({ history: mapHistory(store.get().history, (state) => renameSheet(state, was, is)) });
      later('save', save);
    }
  }

  async function heardChange(change: CellChange): Promise<void> {
    const current = choice();
    if (!hasReadings(current)) return;
    const moved = moveChoice(current, change);
    if (moved === undefined) {
      store.set({ notice: { tone: 'stop', text: readingsWords.gone, trouble: 'gone' } });
      return;
    }
    // Every step moves with the cells, so that taking one back does not point beside them.
    if (moved !== current) {
      enter(mapHistory(store.get().history, (state) => moveChoice(state, change) ?? state));
      if (losesSpread(current, moved))
        store.set({ notice: { tone: 'note', text: readingsWords.spreadGone } });
    }
    const growth = growthAfter(choice(), change);
    if (growth === undefined) return;
    const below = await Promise.all([workbook.readCells(growth.belowX), workbook.readCells(growth.belowY)]);
    if (!below.every((cells) => typeof cells[0]?.[0] === 'number')) return;
    const next = withPlaces(choice(), growth);
    enter(advance(store.get().history, next, stepWords.grow, 'grow'), readingsWords.grew(growth.y.address));
  }

  async function previewSelection(): Promise<void> {
    try {
      const areas = await workbook.selection();
      const [first] = areas;
      const shape =
        first === undefined
          ? ''
          : areas.length > 1
            ? readingsWords.areas(areas.length)
            : readingsWords.shape(first.rows, first.columns);
      const address = areas.map((area) => area.address).join(', ');
      show(first === undefined ? null : { address, shape });
    } catch (error) {
      if (!(error instanceof HostTrouble)) throw error;
      show(null);
    }
  }

  /** Why a selection was refused stands until another one is made. */
  function show(selected: Selected | null): void {
    const same = selected?.address === store.get().selected?.address;
    store.set(same ? { selected } : { selected, refused: '' });
  }

  async function open(): Promise<void> {
    ends.push(
      workbook.onChange((change) => {
        void heardChange(change).catch(warn);
        later('read', read);
      }),
      workbook.onCalculated(() => later('read', read)),
      workbook.onSelection(() => later('selection', previewSelection)),
    );
    const found = loadChoice(await workbook.loadSetting(SETTING));
    if (found !== undefined) {
      saved = saveChoice(found);
      store.set({ history: startHistory(found) });
    }
    store.set({ opened: true });
    await previewSelection();
    await read();
  }

  const session: Session = {
    store,
    workbook,
    change(what, next, mark = '') {
      const current = choice();
      const changed = next(current);
      if (changed !== current) enter(advance(store.get().history, changed, what, mark));
    },
    async takeSelection() {
      try {
        await previewSelection();
        const { columns, ...arrangement } = await takeSelection(workbook);
        store.set({ refused: '', notice: null, picked: null, columns });
        const before = choice();
        session.change(stepWords.readings, (current) => withReadings(current, arrangement));
        if (losesSpread(before, choice())) {
          store.set({ notice: { tone: 'note', text: readingsWords.spreadLeft } });
        }
      } catch (error) {
        if (!(error instanceof Problem) && !(error instanceof HostTrouble)) throw error;
        store.set({ refused: error.message });
      }
    },
    async selectedPlace() {
      const [area] = await workbook.selection();
      return area && { sheet: area.sheet, address: area.address };
    },
    async placeFrom(text) {
      const { sheet, cells } = splitAddress(text.trim());
      if (parseBlock(cells) === undefined) {
        throw new HostTrouble('selection', hostWords.noAddress(text.trim()));
      }
      const own = sheet === '' ? choice().y.sheet : sheet;
      const area = await workbook.locate({ sheet: own, address: cells.replaceAll('$', '') });
      return { sheet: area.sheet, address: area.address };
    },
    undo() {
      const what = store.get().history.past.at(-1)?.what;
      if (what !== undefined) enter(undo(store.get().history), panelWords.undone(what));
    },
    redo() {
      const what = store.get().history.future[0]?.what;
      if (what !== undefined) enter(redo(store.get().history), panelWords.redone(what));
    },
    pick: (position) => store.set({ picked: position }),
    async showReading(position) {
      const { x, y } = choice();
      const place = cellsOfReading(x, y, position);
      if (place === undefined) return;
      await workbook.select(place).catch(warn);
    },
    readAgain() {
      store.set({ cells: null, notice: null });
      void read();
    },
    compareAgain: () => computer.compareAgain(),
    cancel: () => computer.cancel(),
    say: (text) => store.set({ said: text }),
    warn,
    dismiss: () => store.set({ notice: null }),
    close() {
      for (const end of ends) end();
      for (const timer of timers.values()) clearTimeout(timer);
      computer.stop();
    },
  };
  void open().catch(warn);
  return session;
}

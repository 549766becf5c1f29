import { settingsKey } from '../../core/cache/rememberFit.ts';
import type { KeyedReadings } from '../../core/cache/rememberReadings.ts';
import { Problem } from '../../core/problem.ts';
import { inSlices } from '../work/slices.ts';
import type { Choice } from './choice.ts';
import { comparedLaws, compareLaws, givenIn } from './compareLaws.ts';
import { depthSteps } from './depthSteps.ts';
import { attempt, valueIn } from './outcome.ts';
import type { Depth, LawCard, PanelState } from './panelState.ts';
import { comparisonSettings } from './settingsFor.ts';
import { readingsIn, type SheetCells } from './sheetCells.ts';
import type { Store } from './store.ts';

/** Steps that a comparison takes for each law. */
const STEPS_PER_LAW = 2;
/** A comparison that takes longer, in milliseconds, shows how far it is. */
const PATIENCE = 200;

/** Computes what follows from the choice and the cells, and puts it into the store. */
export interface Computer {
  compute(): void;
  compareAgain(): void;
  /** Ends a comparison that is under way, at the user's wish: what there is of it is shown. */
  cancel(): void;
  /** Ends everything; nothing is put into the store any more. */
  stop(): void;
}

/**
 * @param failed told of faults, which are no problems of the readings or the law
 * @param now a clock in milliseconds
 */
export function createComputer(
  store: Store<PanelState>,
  failed: (error: unknown) => void,
  now: () => number = () => performance.now(),
): Computer {
  let comparedKey = '';
  let soFar: LawCard[] = [];
  let comparison = new AbortController();
  let depthRun = new AbortController();

  async function deepen(choice: Choice, cells: SheetCells, keyed: KeyedReadings): Promise<void> {
    depthRun.abort();
    depthRun = new AbortController();
    const { signal } = depthRun;
    let depth: Depth | null = null;
    function* steps() {
      yield;
      for (const next of depthSteps(choice, cells, keyed)) {
        depth = next;
        yield;
      }
    }
    const show = (): void => {
      if (depth !== null && !signal.aborted) store.set({ depth });
    };
    // What takes longer than a slice is shown as far as it is.
    if (await inSlices(steps(), signal, show, now)) store.set({ depth });
  }

  async function compare(choice: Choice, cells: SheetCells, keyed: KeyedReadings): Promise<void> {
    comparison.abort();
    comparison = new AbortController();
    const { signal } = comparison;
    const laws = comparedLaws(choice);
    const cards: LawCard[] = [];
    soFar = cards;
    const start = now();
    const tell = (count: number): void => {
      if (now() - start <= PATIENCE || signal.aborted) return;
      store.set({ progress: { done: Math.floor(count / STEPS_PER_LAW), total: laws.length } });
    };
    const done = await inSlices(compareLaws(keyed, laws, choice, cells, cards), signal, tell, now);
    // Whoever aborted it says what is shown instead.
    if (done) store.set({ cards, progress: null, compared: true, comparisonStopped: '' });
  }

  function compute(): void {
    const { cells, history } = store.get();
    const choice = history.present;
    if (cells === null) return;
    const readings = attempt(() => readingsIn(cells, choice.leftOut));
    store.set({ readings });
    const keyed = valueIn(readings);
    if (keyed === undefined) {
      stop();
      store.set({ cards: [], depth: null, progress: null });
      return;
    }
    deepen(choice, cells, keyed).catch(failed);
    const key = keyOf(choice, cells, keyed);
    if (key === comparedKey) return;
    comparedKey = key;
    compare(choice, cells, keyed).catch((error: unknown) => {
      if (!(error instanceof Problem)) failed(error);
      else store.set({ cards: [], progress: null, comparisonStopped: error.message });
    });
  }

  function stop(): void {
    comparison.abort();
    depthRun.abort();
    comparedKey = '';
  }

  return {
    compute,
    stop,
    compareAgain() {
      comparedKey = '';
      compute();
    },
    cancel() {
      if (store.get().progress === null) return;
      comparison.abort();
      store.set({ cards: [...soFar], progress: null, compared: false });
    },
  };
}

/** What a comparison depends on. */
function keyOf(choice: Choice, cells: SheetCells, keyed: KeyedReadings): string {
  const laws = comparedLaws(choice);
  const given = laws.map((law) => {
    const names = givenIn(law, choice);
    const settings = attempt(() => comparisonSettings(choice, names, cells, keyed.readings.count));
    return 'value' in settings ? settingsKey(settings.value) : settings.problem.message;
  });
  return [keyed.key, ...laws, ...given].join('|');
}

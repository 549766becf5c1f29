import { describe, expect, test } from '@jest/globals';
import { generalLaws } from '../../../core/law/catalogue.ts';
import type { Cell } from '../../../core/readings/readings.ts';
import type { Workbook } from '../../../taskpane/host/workbook.ts';
import type { Choice } from '../../../taskpane/state/choice.ts';
import { createComputer } from '../../../taskpane/state/computer.ts';
import { startHistory } from '../../../taskpane/state/history.ts';
import { noChoice } from '../../../taskpane/state/noChoice.ts';
import { initialState, type PanelState } from '../../../taskpane/state/panelState.ts';
import { readSheetCells } from '../../../taskpane/state/sheetCells.ts';
import { createStore, type Store } from '../../../taskpane/state/store.ts';

/** Power law data, y = 2 x^1.5 with a ripple of 1 %. */
const X: Cell[][] = [1, 2, 3, 5, 8, 12].map((x) => [x]);
const Y: Cell[][] = X.map(([x], i) => [2 * Number(x) ** 1.5 * (1 + (i % 2 === 0 ? 0.01 : -0.01))]);

const chosen: Choice = {
  ...noChoice,
  x: { sheet: 'S', address: 'A1:A6' },
  y: { sheet: 'S', address: 'B1:B6' },
};

/** Only the cells are ever asked for here. */
const workbook = {
  readCells: async ({ address }: { address: string }) => (address.startsWith('A') ? X : Y),
} as unknown as Workbook;

/** A computer over these readings, and a clock that goes on by so many milliseconds whenever it is read. */
async function computing(choice: Choice, tick: number) {
  const cells = await readSheetCells(workbook, choice);
  const store = createStore<PanelState>({ ...initialState, cells, history: startHistory(choice) });
  const faults: unknown[] = [];
  let time = 0;
  const computer = createComputer(
    store,
    (error) => faults.push(error),
    () => {
      time += tick;
      return time;
    },
  );
  return { store, computer, faults };
}

/** Resolves when the store's state is one that the test waits for. */
function until(store: Store<PanelState>, reached: (state: PanelState) => boolean): Promise<void> {
  return new Promise((resolve) => {
    if (reached(store.get())) {
      resolve();
      return;
    }
    const end = store.follow(() => {
      if (!reached(store.get())) return;
      end();
      resolve();
    });
  });
}

describe('a comparison', () => {
  test('ranks every law and draws those that can take the readings', async () => {
    const { store, computer, faults } = await computing(chosen, 0);
    computer.compute();
    await until(store, ({ cards }) => cards.length > 0);
    const { cards, progress } = store.get();
    expect(cards.map(({ law }) => law).sort()).toEqual([...generalLaws].sort());
    expect(cards[0]).toMatchObject({ law: 'power', reason: '', fit: expect.anything() });
    expect(cards.every(({ fit, reason }) => (fit === null) === (reason !== ''))).toBe(true);
    expect([progress, faults]).toEqual([null, []]);
  });

  test('that takes longer than 200 ms shows how far it is, and can be cancelled', async () => {
    const { store, computer } = await computing(chosen, 60);
    computer.compute();
    await until(store, ({ progress }) => (progress?.done ?? 0) >= 2);
    expect(store.get().progress?.total).toBe(generalLaws.length);
    computer.cancel();
    const { cards, compared, progress } = store.get();
    expect(cards.length).toBeGreaterThanOrEqual(2);
    expect(cards.length).toBeLessThan(generalLaws.length);
    expect([compared, progress]).toEqual([false, null]);
    computer.compareAgain();
    await until(store, (state) => state.compared && state.cards.length === generalLaws.length);
  });

  test('takes what is known of a general law’s letters for the chosen law alone', async () => {
    const known = [{ name: 'q', text: '1.5' }];
    const { store, computer } = await computing({ ...chosen, law: 'power', known }, 0);
    computer.compute();
    await until(store, ({ cards }) => cards.length > 0);
    const names = (law: string) =>
      store
        .get()
        .cards.find((card) => card.law === law)
        ?.fit?.constants.filter(({ derived }) => !derived)
        .map(({ name }) => name);
    expect([names('power'), names('exponential')]).toEqual([['p'], ['p', 'q']]);
  });

  test('is made once for the same readings, laws and settings', async () => {
    const { store, computer } = await computing(chosen, 0);
    computer.compute();
    await until(store, ({ cards }) => cards.length > 0);
    const { cards } = store.get();
    store.set({ history: startHistory({ ...chosen, law: 'power' }) });
    computer.compute();
    await until(store, ({ depth }) => depth !== null);
    expect(store.get().cards).toBe(cards);
  });

  test('with an uncertainty that cannot be read says so instead', async () => {
    const choice: Choice = { ...chosen, law: 'power', spreadY: { kind: 'text', text: 'much' } };
    const { store, computer, faults } = await computing(choice, 0);
    computer.compute();
    await until(store, ({ comparisonStopped, depth }) => comparisonStopped !== '' && depth !== null);
    expect(store.get().comparisonStopped).toMatch(/u_y/);
    expect(store.get().depth?.inputs.get('u_y')?.message).toMatch(/u_y.*much/);
    expect(store.get().depth?.fit).toHaveProperty('problem');
    expect(faults).toEqual([]);
  });
});

describe('a law in depth', () => {
  test('comes with its readings and what there is to say about it', async () => {
    const { store, computer } = await computing({ ...chosen, law: 'power' }, 0);
    computer.compute();
    await until(store, ({ depth }) => depth?.findings != null);
    const { depth } = store.get();
    expect(depth?.constants).toEqual(['p', 'q']);
    expect(depth?.rows).toMatchObject({
      value: expect.arrayContaining([expect.objectContaining({ position: 6 })]),
    });
  });

  test('knows only the known constants that it has', async () => {
    const known = [
      { name: 'q', text: '1.5' },
      { name: 'tau', text: '3' },
    ];
    const { store, computer } = await computing({ ...chosen, law: 'power', known }, 0);
    computer.compute();
    await until(store, ({ depth }) => depth !== null);
    const fit = store.get().depth?.fit;
    expect(fit && 'value' in fit && fit.value.constants.map(({ name }) => name)).toEqual(['p']);
  });

  test('nothing arrives after the work was stopped', async () => {
    const { store, computer } = await computing({ ...chosen, law: 'power' }, 0);
    computer.compute();
    computer.stop();
    await new Promise((resolve) => setTimeout(resolve, 30));
    expect([store.get().cards, store.get().depth]).toEqual([[], null]);
  });
});

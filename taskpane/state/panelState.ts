import type { KeyedReadings } from '../../core/cache/rememberReadings.ts';
import type { Fit } from '../../core/fit/fit.ts';
import type { Finding } from '../../core/judge/checks.ts';
import type { Problem } from '../../core/problem.ts';
import type { HostTroubleKind } from '../host/workbook.ts';
import type { Column } from './arrange.ts';
import type { Choice } from './choice.ts';
import { type History, startHistory } from './history.ts';
import { noChoice } from './noChoice.ts';
import type { Outcome } from './outcome.ts';
import type { ReadingRow } from './readingRows.ts';
import type { SheetCells } from './sheetCells.ts';

/** One law among others: drawn and judged, or the reason why it cannot be. */
export interface LawCard {
  /** As it was asked for: a catalogue name or an equation. */
  readonly law: string;
  /** Null when the law cannot take these readings. */
  readonly fit: Fit | null;
  /** Empty for a law that can be judged. */
  readonly reason: string;
  /** Numbers that do not exist are empty texts, as in the sheet. */
  readonly support: number | '';
  readonly bowPercent: number | '';
  readonly misfit: number | '';
}

/** The chosen law on the readings, with what was chosen when it was computed. */
export interface Depth {
  readonly choice: Choice;
  /** Constants of the law, known ones included; empty when the law cannot be read. */
  readonly constants: readonly string[];
  readonly fit: Outcome<Fit>;
  /** What is wrong with each input: `known:R`, `u_y`, `u_x`, `options`. */
  readonly inputs: ReadonlyMap<string, Problem>;
  /** What there is to say about the fit; null while it is being worked out. */
  readonly findings: Outcome<readonly Finding[]> | null;
  /** The readings one by one; null while they are being worked out. */
  readonly rows: Outcome<readonly ReadingRow[]> | null;
}

/** Something to tell the user above everything else. */
export interface Notice {
  readonly tone: 'stop' | 'note';
  readonly text: string;
  /** The kind of the host's refusal, when it was one: then reading again may help. */
  readonly trouble?: HostTroubleKind;
}

/** What is selected in the sheet, or why it cannot be used. */
export interface Selected {
  readonly address: string;
  readonly shape: string;
}

export interface PanelState {
  readonly opened: boolean;
  readonly history: History<Choice>;
  readonly selected: Selected | null;
  /** The series of numbers that were selected when the readings were taken. */
  readonly columns: readonly Column[];
  /** Why the selection could not be taken. */
  readonly refused: string;
  readonly cells: SheetCells | null;
  readonly readings: Outcome<KeyedReadings> | null;
  readonly cards: readonly LawCard[];
  /** False when a comparison was cancelled before its end. */
  readonly compared: boolean;
  /** Why laws cannot be compared at all; empty when they can. */
  readonly comparisonStopped: string;
  /** A comparison that takes long enough to be shown. */
  readonly progress: { readonly done: number; readonly total: number } | null;
  readonly depth: Depth | null;
  /** 1-based position of the reading that is looked at. */
  readonly picked: number | null;
  readonly notice: Notice | null;
  /** What a screen reader hears after a step. */
  readonly said: string;
}

export const initialState: PanelState = {
  opened: false,
  history: startHistory(noChoice),
  selected: null,
  columns: [],
  refused: '',
  cells: null,
  readings: null,
  cards: [],
  compared: true,
  comparisonStopped: '',
  progress: null,
  depth: null,
  picked: null,
  notice: null,
  said: '',
};

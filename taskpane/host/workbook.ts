import type { Cell } from '../../core/readings/readings.ts';
import type { Place } from '../state/choice.ts';

/** One area that the user has selected, cut to the part of the sheet that is in use. */
export interface SelectedArea extends Place {
  /** Zero-based first row and column on the sheet. */
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly columns: number;
}

/** Something changed in the cells of a sheet. */
export interface CellChange extends Place {
  /** `cells` when values changed; the others when whole rows or columns came or went at `address`. */
  readonly kind: 'cells' | 'rowsInserted' | 'rowsDeleted' | 'columnsInserted' | 'columnsDeleted' | 'other';
}

/**
 * The workbook as the panel sees it: the only module that speaks the host's API lies behind this. Every promise
 * rejects with a `HostTrouble`, whose message is a plain sentence.
 */
export interface Workbook {
  /** The selected areas in the order in which they were selected; a single cell stands for the block around it. */
  selection(): Promise<readonly SelectedArea[]>;
  /** The cells of a place, row by row; a blank cell is null, whatever the host makes of it elsewhere. */
  readCells(place: Place): Promise<readonly (readonly Cell[])[]>;
  /** Where a place lies on its sheet. */
  locate(place: Place): Promise<SelectedArea>;
  /** Up to `rows` rows of cells above a place, the farthest first; fewer at the top of the sheet. */
  cellsAbove(place: Place, rows: number): Promise<readonly (readonly Cell[])[]>;
  /** Shows and selects a place. */
  select(place: Place): Promise<void>;
  /** Calls back after cells changed or sheets went, by whoever. Returns what ends it. */
  onChange(heard: (change: CellChange) => void): () => void;
  /** Calls back after formulas were calculated anew. */
  onCalculated(heard: () => void): () => void;
  /** Calls back after the selection or the sheet in sight changed. */
  onSelection(heard: () => void): () => void;
  /** A value that the workbook keeps for the panel, or null. */
  loadSetting(key: string): Promise<unknown>;
  saveSetting(key: string, value: unknown): Promise<void>;
  /** Host work of one's own, in one batch context; what the host refuses rejects as a `HostTrouble`. */
  run<T>(work: (context: Excel.RequestContext) => Promise<T>): Promise<T>;
}

export type HostTroubleKind = 'gone' | 'protected' | 'busy' | 'selection' | 'size' | 'other';

/** Something the host refused, in a plain sentence; `kind` says what may help. */
export class HostTrouble extends Error {
  readonly kind: HostTroubleKind;

  constructor(kind: HostTroubleKind, message: string) {
    super(message);
    this.name = 'HostTrouble';
    this.kind = kind;
  }
}

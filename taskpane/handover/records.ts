import type { Workbook } from '../host/workbook.ts';
import type { WrittenFor } from './readsAs.ts';

export type HandoverKind = 'block' | 'charts' | 'card' | 'workings';

export const handoverKinds: readonly HandoverKind[] = ['block', 'charts', 'card', 'workings'];

/** A formula that was replaced by its values, by its place in the area, with the cells that it spilled over. */
export interface FrozenFormula {
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly columns: number;
  readonly formula: string;
}

/** What one hand-over put into the workbook: enough to freeze it, to thaw it and to take it back. */
export interface Placed {
  readonly id: string;
  readonly kind: HandoverKind;
  /** The workbook's name for the area, which moves along when rows are inserted. */
  readonly areaName: string;
  /** Its names for the ranges that the formulas read: readings, and uncertainties in cells. */
  readonly sourceNames: readonly string[];
  readonly sheet: string;
  readonly address: string;
  /** True when the sheet was made for it. */
  readonly ownSheet: boolean;
  readonly charts: readonly string[];
  readonly shapes: readonly string[];
  /** What stood in the area before, cell by cell, where something did: as typed. */
  readonly before: readonly {
    readonly row: number;
    readonly column: number;
    readonly content: string | number | boolean;
  }[];
  /** Widths of the area's columns before, in points. */
  readonly widths: readonly number[];
  /** Where the area and what it reads were when it was frozen, and the formulas; null while it is live. */
  readonly frozen: { readonly at: string; readonly formulas: readonly FrozenFormula[] } | null;
  /** What it was written for, to know whether the panel's picture may renew it. */
  readonly of: WrittenFor;
}

const SETTING = 'tautline.handover';
const VERSION = 2;

/** What has been handed over in this workbook and is still there, oldest first. */
export async function loadPlaced(workbook: Workbook): Promise<readonly Placed[]> {
  const placed = await savedPlaced(workbook);
  return workbook.run(async (context) => {
    const named = placed.map(({ areaName }) => {
      const range = context.workbook.names.getItemOrNullObject(areaName).getRangeOrNullObject();
      return range.load('address');
    });
    await context.sync();
    return placed.filter((_, k) => named[k]?.isNullObject === false);
  });
}

async function savedPlaced(workbook: Workbook): Promise<readonly Placed[]> {
  const saved = await workbook.loadSetting(SETTING);
  if (typeof saved !== 'string') return [];
  const parsed: unknown = JSON.parse(saved);
  if (typeof parsed !== 'object' || parsed === null || !('version' in parsed) || parsed.version !== VERSION) {
    return [];
  }
  // Written by savePlaced of this version.
  return 'placed' in parsed && Array.isArray(parsed.placed) ? (parsed.placed as readonly Placed[]) : [];
}

export async function savePlaced(workbook: Workbook, placed: readonly Placed[]): Promise<void> {
  await workbook.saveSetting(SETTING, JSON.stringify({ version: VERSION, placed }));
}

import type { UniverGrid } from '../engine/univerGrid.ts';
import type { BlankMode, FunctionsMetadata } from '../grid/customFunctions.ts';
import type { Book } from '../office/book.ts';

/** What the stand-in's page offers to the add-in's page in its frame, and to tests. */
export interface StandIn {
  readonly grid: UniverGrid;
  readonly book: Book;
  readonly blank: BlankMode;
  readonly theme: 'light' | 'dark' | 'contrast' | null;
  readonly metadata: FunctionsMetadata;
  readonly namespace: string;
  showPanel(shown: boolean): void;
}

declare global {
  interface Window {
    standIn?: StandIn;
  }
}

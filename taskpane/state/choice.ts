/** A block of cells: the sheet's name and the address without it, `B4:B60`. */
export interface Place {
  readonly sheet: string;
  readonly address: string;
}

/** A quantity as its header cell describes it: `time / h` is the name `time` in the unit `h`. */
export interface Heading {
  readonly name: string;
  /** Empty when the header says none. */
  readonly unit: string;
}

/** One known constant as the user typed it: a number, with `±` and a standard uncertainty if there is one. */
export interface KnownEntry {
  readonly name: string;
  readonly text: string;
}

/** How uncertain the readings are: text as the sheet function takes it (`0.05`, `2%`, `equal`, …), or a range. */
export type SpreadEntry =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'range'; readonly place: Place };

/** Everything the user has chosen; the workbook's settings remember it, and every result follows from it. */
export interface Choice {
  readonly x: Place;
  readonly y: Place;
  readonly xHeading: Heading;
  readonly yHeading: Heading;
  /** Catalogue name or equation. */
  readonly law: string;
  /** Equations that the user added beside the catalogue, to be compared with it. */
  readonly ownLaws: readonly string[];
  readonly known: readonly KnownEntry[];
  readonly spreadY: SpreadEntry;
  readonly spreadX: SpreadEntry;
  /** Options that differ from their defaults, as the sheet functions take them: `coverage` → `0.99`. */
  readonly options: ReadonlyMap<string, string>;
  /** 1-based positions of readings that the user leaves out for a look; the cells stay as they are. */
  readonly leftOut: readonly number[];
  /** Units of the constants as the user typed them, by constant. */
  readonly units?: ReadonlyMap<string, string>;
}

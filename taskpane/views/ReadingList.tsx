import { useLayoutEffect, useRef } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { listWords, stepWords } from '../../core/words/panelWords.ts';
import { problemIn, valueIn } from '../state/outcome.ts';
import type { Depth } from '../state/panelState.ts';
import { type ReadingRow, readingRow } from '../state/readingRows.ts';
import { useChoice, usePart, useSession } from './context.ts';
import { decimals, decimalsFor, figures } from './figures.ts';
import { PickedReading } from './PickedReading.tsx';
import { Part } from './parts.tsx';

/** All readings with what the line leaves of each; one of them, picked here or in a plot, is shown in full. */
export function ReadingList(props: { readonly fit: Fit; readonly found: Depth['rows'] }) {
  const session = useSession();
  const { fit, found } = props;
  const { leftOut } = useChoice();
  const picked = usePart((state) => state.picked);
  const list = useRef<HTMLDivElement>(null);
  const rows = valueIn(found) ?? [];
  const total = fit.readings.x.length + leftOut.length;
  const at = rows.findIndex((row) => row.position === picked);
  // A plot shows more readings than a long list does.
  const current = rows[at] ?? (picked === null ? undefined : readingRow(fit, picked));
  const places = decimalsFor(largestOf(rows, 'residual'), 3);
  const largest = Math.max(3, largestOf(rows, 'standardised'));

  // A reading picked in a plot comes into sight in the list, which scrolls by itself only.
  useLayoutEffect(() => {
    const box = list.current;
    const row = picked === null ? null : document.getElementById(idOf(picked));
    if (!box || !row) return;
    if (row.offsetTop < box.scrollTop) box.scrollTop = row.offsetTop;
    const end = row.offsetTop + row.offsetHeight;
    if (end > box.scrollTop + box.clientHeight) box.scrollTop = end - box.clientHeight;
  }, [picked]);

  const go = (index: number): void => {
    const row = rows[Math.max(0, Math.min(rows.length - 1, index))];
    if (row !== undefined) session.pick(row.position);
  };
  const onKey = (event: KeyboardEvent): void => {
    const moves: Readonly<Record<string, number>> = {
      ArrowDown: at + 1,
      ArrowUp: at < 0 ? 0 : at - 1,
      Home: 0,
      End: rows.length - 1,
      PageDown: at + 8,
      PageUp: at - 8,
    };
    const target = moves[event.key];
    if (target !== undefined) go(target);
    else if (event.key === 'Enter' && picked !== null) void session.showReading(picked);
    else return;
    event.preventDefault();
  };

  return (
    <Part title={listWords.title}>
      {problemIn(found) !== undefined && <p class="wrong">{problemIn(found)?.message}</p>}
      <div class="reading-head" aria-hidden="true">
        <span>{listWords.reading}</span>
        <span>{listWords.residual}</span>
        <span>{listWords.leverage}</span>
      </div>
      <div
        class="reading-list"
        ref={list}
        role="listbox"
        tabIndex={0}
        aria-label={`${listWords.title}. ${listWords.help}`}
        aria-activedescendant={rows[at] === undefined ? undefined : idOf(rows[at].position)}
        onKeyDown={onKey}
        onClick={(event) => {
          const row = event.target instanceof Element ? event.target.closest('[role="option"]') : null;
          if (row instanceof HTMLElement) session.pick(Number(row.dataset['position']));
          event.currentTarget.focus();
        }}
      >
        {rows.map((row) => (
          <Row
            key={row.position}
            row={row}
            largest={largest}
            places={places}
            selected={row.position === picked}
          />
        ))}
      </div>
      {rows.length < total && <p class="hint">{listWords.more(rows.length, total)}</p>}
      <PickedReading row={current} />
      {leftOut.length > 1 && (
        <button
          type="button"
          onClick={() => session.change(stepWords.takeAllBack, (choice) => ({ ...choice, leftOut: [] }))}
        >
          {listWords.takeAllIn}
        </button>
      )}
    </Part>
  );
}

function largestOf(rows: readonly ReadingRow[], column: 'residual' | 'standardised'): number {
  return rows.reduce((most, row) => {
    const value = row[column];
    return value === '' || !Number.isFinite(value) ? most : Math.max(most, Math.abs(value));
  }, 0);
}

function idOf(position: number): string {
  return `reading-${position}`;
}

function Row(props: {
  readonly row: ReadingRow;
  /** The largest standardised residual, which the bars are drawn against. */
  readonly largest: number;
  /** Decimals of residuals, where decimals suit them. */
  readonly places: number | undefined;
  readonly selected: boolean;
}) {
  const { row, largest, places, selected } = props;
  const { position, residual, standardised, leverage, finding, leftOut } = row;
  const share = standardised === '' ? 0 : (50 * standardised) / largest;
  return (
    // The list box holds the focus, the keys and the clicks.
    <div
      id={idOf(position)}
      data-position={position}
      tabIndex={-1}
      role="option"
      aria-selected={selected}
      class={`reading${leftOut ? ' left-out' : ''}${finding === '' ? '' : ' found'}`}
    >
      <span class="number">{position}</span>
      <span class="unseen">{listWords.residual}</span>
      <span class="number residual">
        <span class="deviation" aria-hidden="true">
          <span style={{ left: `${Math.min(50, 50 + share)}%`, width: `${Math.abs(share)}%` }} />
        </span>
        {places === undefined ? figures(residual, 2) : decimals(residual, places)}
      </span>
      <span class="unseen">{listWords.leverage}</span>
      <span class="number leverage">{decimals(leverage, 3)}</span>
      {(finding !== '' || leftOut) && <span class="finding">{leftOut ? listWords.left : finding}</span>}
    </div>
  );
}

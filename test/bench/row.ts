/** One line of the results: what was timed, against what, and what is asked of it. */
export interface Row {
  readonly what: string;
  readonly size: string;
  /** The time itself, as text. */
  readonly time: string;
  readonly against: string;
  /** How many times the other's time it took; below 1 when it is faster. Undefined where there is nothing to compare. */
  readonly ratio?: number;
  readonly target?: Target;
}

export type Target = { readonly atMost: number } | { readonly atLeastFaster: number };

/** A time in the unit that suits it. */
export function timeText(milliseconds: number): string {
  if (milliseconds >= 1000) return `${(milliseconds / 1000).toPrecision(3)} s`;
  if (milliseconds >= 1) return `${milliseconds.toPrecision(3)} ms`;
  return `${(milliseconds * 1000).toPrecision(3)} µs`;
}

function ratioText({ ratio, target }: Row): string {
  if (ratio === undefined) return '';
  if (target !== undefined && 'atLeastFaster' in target) return `${(1 / ratio).toFixed(1)} times faster`;
  return `${ratio.toFixed(2)} times`;
}

function targetText({ ratio, target }: Row): [string, string] {
  if (target === undefined || ratio === undefined) return ['', ''];
  if ('atMost' in target) return [`≤ ${target.atMost}`, ratio <= target.atMost ? 'met' : 'missed'];
  const { atLeastFaster } = target;
  return [`≥ ${atLeastFaster} times faster`, 1 / ratio >= atLeastFaster ? 'met' : 'missed'];
}

/** The results as a Markdown table. */
export function table(rows: readonly Row[]): string {
  const lines = rows.map((row) => {
    const [target, met] = targetText(row);
    return [row.what, row.size, row.time, row.against, ratioText(row), target, met];
  });
  const header = ['what', 'size', 'time', 'against', 'ratio', 'target', ''];
  return [header, header.map(() => '---'), ...lines].map((cells) => `| ${cells.join(' | ')} |`).join('\n');
}

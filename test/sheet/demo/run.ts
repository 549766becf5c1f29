import { openSheet, type ShownValue } from '../headless.ts';
import type { DemoSheet } from './demoSheet.ts';
import { type FollowedStep, follow } from './follow.ts';
import { demoWorkbook } from './workbook.ts';

/** Types the demo's readings one by one without a screen, and writes how constants and ranking settle. */
export async function runDemo(write: (line: string) => void): Promise<void> {
  const sheet = await openSheet({ workbook: demoWorkbook });
  await sheet.settle();
  for (const demo of demoWorkbook) {
    write(`\n${heading(demo)}`);
    const steps: FollowedStep[] = [];
    for await (const step of follow(sheet, demo)) steps.push(step);
    for (const line of table(demo, steps)) write(line);
  }
  sheet.close();
}

function heading(demo: DemoSheet): string {
  const title = String(Object.values(demo.blocks)[0]?.[0]?.[0] ?? demo.name);
  return `${title}\n${'─'.repeat(title.length)}`;
}

/** A text table of the steps: what was typed, the constants, and the two best supported laws. */
export function table(demo: DemoSheet, steps: readonly FollowedStep[]): string[] {
  const last = steps.at(-1);
  const names = last?.constants.map((one) => one.name) ?? [];
  const header = [...headersOf(demo), ...names, 'best supported', 'next'];
  const rows = steps.map((step) => [
    ...step.typed.map(shown),
    ...(step.constants.length > 0
      ? names.map((name) => constant(step, name))
      : names.map((_, index) => (index === 0 ? '…' : ''))),
    ranked(step, 0),
    ranked(step, 1),
  ]);
  const widths = header.map((_, column) =>
    Math.max(...[header, ...rows].map((row) => (row[column] ?? '').length)),
  );
  const line = (cells: readonly string[]) =>
    cells
      .map((cell, column) => cell.padEnd(widths[column] ?? 0))
      .join('   ')
      .trimEnd();
  return [line(header), widths.map((width) => '─'.repeat(width)).join('───'), ...rows.map(line)];
}

/** The header texts over the columns that are typed. */
function headersOf(demo: DemoSheet): string[] {
  const texts = (demo.blocks['A5']?.[0] ?? []).map(String);
  const [first = []] = demo.blocks['A6'] ?? [];
  const count = demo.followed.typed.split(':')[1]?.startsWith('C') ? 3 : 2;
  return texts.slice(0, count).filter((_, index) => first[index] !== null);
}

function shown(value: ShownValue): string {
  return value === null ? '' : String(value);
}

function constant(step: FollowedStep, name: string): string {
  const found = step.constants.find((one) => one.name === name);
  if (!found || typeof found.value !== 'number') return '';
  const { value, uncertainty } = found;
  if (typeof uncertainty !== 'number' || uncertainty === 0) return round(value, 4);
  const decimals = Math.max(0, 1 - Math.floor(Math.log10(uncertainty)));
  const plain = Math.abs(value) < 1e6 && decimals <= 7;
  if (!plain) return `${value.toExponential(3)} ± ${uncertainty.toExponential(1)}`;
  return `${value.toFixed(decimals)} ± ${uncertainty.toFixed(decimals)}`;
}

function ranked(step: FollowedStep, index: number): string {
  const law = step.ranking[index];
  return law && typeof law.support === 'number' ? `${law.law} ${law.support.toFixed(1)} %` : '';
}

function round(value: number, digits: number): string {
  return String(Number(value.toPrecision(digits)));
}

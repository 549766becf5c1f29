import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import type { Frame } from 'playwright-core';

const source = readFileSync(
  join(createRequire(join(process.cwd(), 'package.json')).resolve('axe-core'), '..', 'axe.min.js'),
  'utf8',
);

interface Violation {
  readonly id: string;
  readonly help: string;
  readonly nodes: readonly { readonly html: string; readonly failureSummary?: string }[];
}

/** What axe-core finds against WCAG 2.0 to 2.2, levels A and AA, and its good practices, one line for each element. */
export async function accessibilityFaults(frame: Frame): Promise<string[]> {
  await frame.evaluate(source);
  const violations = await frame.evaluate(async (): Promise<readonly Violation[]> => {
    // Put there by the line above.
    const axe = Reflect.get(window, 'axe') as { run(): Promise<{ violations: Violation[] }> };
    return (await axe.run()).violations;
  });
  return violations.flatMap(({ id, help, nodes }) =>
    nodes.map(({ html, failureSummary }) => `${id}: ${help}: ${html} ${failureSummary ?? ''}`),
  );
}

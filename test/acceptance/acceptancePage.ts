import { metaPolicy } from '../../manifest-template/contentSecurityPolicy.ts';
import { escapeMarkup } from '../../manifest-template/fillTemplate.ts';
import { acceptanceData } from './acceptanceData.ts';
import type { SheetRow } from './acceptanceSheet.ts';

/** What only a person with the spreadsheet program can see. */
const BY_HAND = [
  'The Tautline button stands on the Home tab, with its icon sharp and legible in light and dark themes.',
  'Typing =TAUT. offers the functions; choosing one shows what its arguments are; its help link opens the page of functions.',
  'Type =TAUT.LAWS() in an empty sheet: the whole table spills.',
  'In the bottle test, type 150 under minutes and 0.08 under chlorine in the first blank row: every value of that set changes within a second, without any other key.',
  'Take that reading out again: the values return, and the verdicts say “agrees”.',
  'Select the cell of “an unknown law is refused” and open the mark beside it: the message names the law and what it may be.',
  'Select the two columns of the bottle test and open the panel: it shows the readings, the laws in order and the straight line.',
  'Let the panel write its results into the sheet: it fills empty cells only, and asks before it would cover one that is not.',
  'Go through the panel with the Tab key alone; then in a high-contrast theme.',
  'Save, close and open the workbook: the values stand there at once. Change a reading: they follow.',
  'Close the panel: the formulas go on working.',
];

/** The page that goes with the sheet: ten minutes of steps, and every formula with its value. */
export function acceptancePage(rows: readonly SheetRow[], version: string): string {
  const checks = rows.map(
    ({ check, formula, expected }) =>
      `<tr><td>${escapeMarkup(check.what)}</td><td><code>${escapeMarkup(formula)}</code></td>` +
      `<td><code>${escapeMarkup(String(expected))}</code></td><td>${escapeMarkup(check.published?.source ?? '')}</td></tr>`,
  );
  const sources = Object.values(acceptanceData()).map(
    ({ title, source }) => `<li>${escapeMarkup(title)}: ${escapeMarkup(source)}</li>`,
  );
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${escapeMarkup(metaPolicy)}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Tautline ${escapeMarkup(version)}: acceptance sheet</title>
<link rel="stylesheet" href="help.css">
</head>
<body class="wide">
<main>
<h1>Tautline ${escapeMarkup(version)}: acceptance sheet</h1>
<p class="lead">Ten minutes in your own spreadsheet program, once Tautline is installed there.</p>
<section aria-labelledby="numbers">
<h2 id="numbers">The numbers</h2>
<ol>
<li>Open <a href="acceptance.csv">acceptance.csv</a> in the spreadsheet program. Readings stand on the left, formulas on the right.
Where the system writes numbers with a decimal comma, take the program's text import and choose comma as separator and English numbers.</li>
<li>Cell B2 counts the verdicts “agrees”. It must show ${rows.length} of ${rows.length}. Numbers must agree to nine digits.</li>
</ol>
</section>
<section aria-labelledby="hand">
<h2 id="hand">What only you can see</h2>
<ol>
${BY_HAND.map((step) => `<li>${escapeMarkup(step)}</li>`).join('\n')}
</ol>
</section>
<section aria-labelledby="values">
<h2 id="values">The formulas and their values</h2>
<p>The values were computed by the very script that this folder holds. Where a published value exists, a test holds the script to it.</p>
<ul>${sources.join('')}</ul>
<table>
<thead><tr><th scope="col">check</th><th scope="col">formula</th><th scope="col">value</th><th scope="col">held against</th></tr></thead>
<tbody>
${checks.join('\n')}
</tbody>
</table>
</section>
</main>
</body>
</html>
`;
}

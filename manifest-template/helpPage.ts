import type { SheetFunction, SheetParameter } from './checkFunctions.ts';
import { metaPolicy } from './contentSecurityPolicy.ts';
import { escapeMarkup, fillTemplate } from './fillTemplate.ts';

/** Parameters that many functions share, and the part of functions.html that explains them at length. */
const EXPLAINED: ReadonlyMap<string, string> = new Map([
  ['x', 'readings'],
  ['y', 'readings'],
  ['law', 'law'],
  ['known', 'known'],
  ['u_y', 'uncertainty'],
  ['u_x', 'uncertainty'],
  ['options', 'options'],
]);

/**
 * The page that the host opens for "help on this function": a section for each function, under the anchor that
 * the function's helpUrl names.
 *
 * @param shell text of functions.html
 * @param functions as functions.json declares them
 * @throws Error when two functions share an anchor or one has none
 */
export function helpPage(shell: string, functions: readonly SheetFunction[]): string {
  const anchors = functions.map(anchorOf);
  const doubled = anchors.find((anchor, place) => anchors.indexOf(anchor) !== place);
  if (doubled !== undefined) throw new Error(`two functions have the help anchor #${doubled}`);
  const index = functions.map((one) => `<li><a href="#${anchorOf(one)}"><code>${one.name}</code></a></li>`);
  return fillTemplate(shell, {
    policy: metaPolicy,
    index: index.join(''),
    functions: functions.map(section).join('\n'),
  });
}

/** The formula with its arguments, optional ones in brackets: `=TAUT.LINE(x, y, law, [known])`. */
export function signature({ name, parameters }: SheetFunction): string {
  const argument = (parameter: SheetParameter) => {
    const word = parameter.repeating ? `${parameter.name}, …` : parameter.name;
    return parameter.optional ? `[${word}]` : word;
  };
  return `=TAUT.${name}(${parameters.map(argument).join(', ')})`;
}

function anchorOf({ id, helpUrl }: SheetFunction): string {
  const anchor = helpUrl.split('#')[1] ?? '';
  if (!/^[A-Za-z][\w.-]*$/.test(anchor))
    throw new Error(`${id} has no help anchor in its helpUrl ${helpUrl}`);
  return anchor;
}

function parameterName(name: string): string {
  const code = `<code>${escapeMarkup(name)}</code>`;
  const target = EXPLAINED.get(name);
  return target === undefined ? code : `<a href="#${target}">${code}</a>`;
}

function section(declared: SheetFunction): string {
  const anchor = anchorOf(declared);
  const parameters = declared.parameters.map(
    ({ name, description, optional }) =>
      `<dt>${parameterName(name)}${optional ? ' <span class="may">optional</span>' : ''}</dt>` +
      `<dd>${escapeMarkup(description)}</dd>`,
  );
  const list = parameters.length > 0 ? `\n<dl>${parameters.join('\n')}</dl>` : '';
  return `<section id="${anchor}" aria-labelledby="${anchor}-title">
<h2 id="${anchor}-title">TAUT.${escapeMarkup(declared.name)}</h2>
<p>${escapeMarkup(declared.description)}</p>
<pre><code>${escapeMarkup(signature(declared))}</code></pre>${list}
</section>`;
}

import { sheetFunctions } from './sheetFunctions.ts';
import { signature } from './table.ts';

function escaped(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}

/** The page that the host's "help on this function" opens: `functions.html`, a section for each function. */
export function helpPage(): string {
  const sections = sheetFunctions.map((one) => {
    const parameters = one.parameters.map(
      ({ name, description, optional }) =>
        `<dt><code>${escaped(name)}</code>${optional ? ' (optional)' : ''}</dt><dd>${escaped(description)}</dd>`,
    );
    const list = parameters.length > 0 ? `<dl>${parameters.join('')}</dl>` : '';
    return `<section id="${one.id}"><h2><code>${escaped(signature(one))}</code></h2><p>${escaped(one.description)}</p>${list}</section>`;
  });
  return `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>Tautline: sheet functions</title>
<style>:root{color-scheme:light dark}body{font:16px/1.5 system-ui,sans-serif;max-width:44rem;margin:2rem auto;padding:0 1rem}dd{margin:0 0 .5rem 1.5rem}h2{font-size:1.1rem}</style>
</head><body><main><h1>Sheet functions</h1>
${sections.join('\n')}
</main></body></html>
`;
}

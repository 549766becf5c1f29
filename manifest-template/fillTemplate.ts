/**
 * A template with each `{{name}}` replaced by its value, text values escaped for XML and HTML.
 *
 * @param template text with `{{name}}` for escaped text and `{{{name}}}` for ready-made markup
 * @throws Error when the template names a value that is not given, or a given value is never used
 */
export function fillTemplate(template: string, values: Readonly<Record<string, string>>): string {
  const used = new Set<string>();
  const take = (name: string): string => {
    const value = Object.hasOwn(values, name) ? values[name] : undefined;
    if (value === undefined) throw new Error(`the template asks for {{${name}}}, which is not given`);
    used.add(name);
    return value;
  };
  const filled = template.replace(/\{\{\{(\w+)\}\}\}|\{\{(\w+)\}\}/g, (_whole, markup, text) =>
    markup === undefined ? escapeMarkup(take(text)) : take(markup),
  );
  for (const name of Object.keys(values)) {
    if (!used.has(name)) throw new Error(`the template has no place for {{${name}}}`);
  }
  return filled;
}

/** Text made safe between tags and inside quoted attributes. */
export function escapeMarkup(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}

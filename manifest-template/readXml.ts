/** An element of a well-formed XML document, names as written (prefix kept). */
export interface XmlElement {
  readonly name: string;
  readonly attributes: ReadonlyMap<string, string>;
  readonly children: readonly XmlElement[];
  /** The element's own text, its children's left out, trimmed. */
  readonly text: string;
}

interface OpenElement {
  name: string;
  attributes: Map<string, string>;
  children: OpenElement[];
  text: string;
}

const TOKEN =
  /<!--[\s\S]*?-->|<\?[\s\S]*?\?>|<(\/?)([\w:.-]+)((?:\s+[\w:.-]+\s*=\s*(?:"[^"]*"|'[^']*'))*)\s*(\/?)>|([^<]+)/g;
const ATTRIBUTE = /([\w:.-]+)\s*=\s*(?:"([^"]*)"|'([^']*)')/g;
const ENTITIES: Readonly<Record<string, string>> = {
  amp: '&',
  lt: '<',
  gt: '>',
  quot: '"',
  apos: "'",
  '#39': "'",
};

/**
 * Reads an XML document without doctype or CDATA, which is all that a manifest needs.
 *
 * @throws Error when tags do not match or a character is left over
 */
export function readXml(xml: string): XmlElement {
  const top: OpenElement = { name: '', attributes: new Map(), children: [], text: '' };
  const open = [top];
  let at = 0;
  for (const token of xml.matchAll(TOKEN)) {
    const [whole, closing, name, attributes = '', selfClosing, text] = token;
    if (token.index !== at) throw new Error(`the XML cannot be read at character ${at + 1}`);
    at += whole.length;
    const parent = open[open.length - 1];
    if (parent === undefined) throw new Error('the XML goes on after its root element');
    if (text !== undefined) parent.text += plainText(text);
    if (name === undefined) continue;
    if (closing === '/') {
      if (parent.name !== name) throw new Error(`</${name}> closes <${parent.name}>`);
      open.pop();
      continue;
    }
    const element: OpenElement = { name, attributes: readAttributes(attributes), children: [], text: '' };
    parent.children.push(element);
    if (selfClosing !== '/') open.push(element);
  }
  const root = top.children[0];
  if (at !== xml.length || open.length !== 1 || root === undefined || top.children.length !== 1) {
    throw new Error('the XML is not one complete element');
  }
  return root;
}

/** All elements below and including `element`, in document order. */
export function allElements(element: XmlElement): XmlElement[] {
  return [element, ...element.children.flatMap(allElements)];
}

function readAttributes(text: string): Map<string, string> {
  const attributes = new Map<string, string>();
  for (const [, name = '', double, single] of text.matchAll(ATTRIBUTE)) {
    attributes.set(name, plainText(double ?? single ?? ''));
  }
  return attributes;
}

function plainText(text: string): string {
  return text.replace(/&(#?\w+);/g, (whole, name) => ENTITIES[name] ?? whole).trim();
}

import { allElements, readXml, type XmlElement } from './readXml.ts';

const ID_LIMIT = 32;
const SHORT_LIMIT = 125;
const LONG_LIMIT = 250;
const RIBBON_ICON_SIZES = ['16', '32', '80'];
const NEEDED_SETS: Readonly<Record<string, string>> = {
  SharedRuntime: '1.1',
  CustomFunctionsRuntime: '1.3',
  ExcelApi: '1.12',
};

/**
 * What is wrong with a manifest although its schema lets it pass: one sentence for each fault, none when it is fit.
 *
 * @param xml an add-in-only manifest, valid by the published schemas
 */
export function checkManifest(xml: string): string[] {
  const elements = allElements(readXml(xml));
  const faults: string[] = [];
  const named = (name: string) => elements.filter((element) => element.name === name);
  const need = (name: string, why: string) => {
    if (named(name).length === 0) faults.push(`<${name}> is missing: ${why}`);
  };

  need('IconUrl', 'the list of add-ins shows no icon');
  need('HighResolutionIconUrl', 'the icon is blurred on fine screens');
  need('SupportUrl', 'hosts refuse a manifest without it');
  need('Metadata', 'the host would find no functions');
  need('Namespace', 'the functions would have no prefix');
  need('Runtimes', 'functions and panel would run apart');
  if (named('TaskpaneId').length > 0) faults.push('<TaskpaneId> must be left out: there is one page');
  checkVersion(elements, faults);
  checkResources(elements, faults);
  checkRuntime(elements, faults);
  checkIcons(elements, faults);
  checkSets(elements, faults);
  for (const element of elements) {
    for (const [attribute, value] of element.attributes) {
      const isAddress = attribute === 'DefaultValue' || attribute === 'Value';
      if (isAddress && /^http:/i.test(value))
        faults.push(`<${element.name}> must use https:, but has ${value}`);
    }
  }
  return faults;
}

function checkVersion(elements: readonly XmlElement[], faults: string[]): void {
  const version = elements.find((element) => element.name === 'Version')?.text ?? '';
  if (!/^\d{1,5}(\.\d{1,5}){0,3}$/.test(version)) {
    faults.push(`<Version> must be one to four parts of at most five digits, but is "${version}"`);
  }
}

function checkResources(elements: readonly XmlElement[], faults: string[]): void {
  const kinds = ['bt:Image', 'bt:Url', 'bt:String'];
  const defined = new Map<string, XmlElement>();
  for (const element of elements) {
    const id = element.attributes.get('id');
    if (id === undefined) continue;
    if (id.length > ID_LIMIT) faults.push(`the id ${id} is longer than ${ID_LIMIT} characters`);
    if (!kinds.includes(element.name)) continue;
    if (defined.has(id)) faults.push(`the id ${id} is defined twice`);
    defined.set(id, element);
  }
  const asked = new Set(elements.flatMap((element) => element.attributes.get('resid') ?? []));
  for (const id of asked) if (!defined.has(id)) faults.push(`resid ${id} leads nowhere`);
  for (const id of defined.keys()) if (!asked.has(id)) faults.push(`the resource ${id} is never used`);
  checkLengths(elements, 'bt:ShortStrings', SHORT_LIMIT, faults);
  checkLengths(elements, 'bt:LongStrings', LONG_LIMIT, faults);
}

function checkLengths(elements: readonly XmlElement[], list: string, limit: number, faults: string[]): void {
  const strings = elements.filter((element) => element.name === list).flatMap((element) => element.children);
  for (const string of strings) {
    const length = string.attributes.get('DefaultValue')?.length ?? 0;
    if (length > limit) {
      faults.push(`the text ${string.attributes.get('id')} has ${length} characters, more than ${limit}`);
    }
  }
}

/** One long-lived runtime, first in its host, shared by the functions, the ribbon's commands and the panel. */
function checkRuntime(elements: readonly XmlElement[], faults: string[]): void {
  for (const host of elements) {
    const place = host.children.findIndex((child) => child.name === 'Runtimes');
    if (place > 0) faults.push('<Runtimes> must come first in its <Host>');
  }
  const runtime = elements.find((element) => element.name === 'Runtime');
  if (runtime === undefined) return;
  if (runtime.attributes.get('lifetime') !== 'long') faults.push('<Runtime> must have lifetime="long"');
  const shared = runtime.attributes.get('resid');
  const users = elements.flatMap((element) => {
    if (element.name === 'FunctionFile') return [element];
    const opensPage = element.name === 'Page' || element.attributes.get('xsi:type') === 'ShowTaskpane';
    return opensPage ? element.children.filter((child) => child.name === 'SourceLocation') : [];
  });
  for (const user of users) {
    const resid = user.attributes.get('resid');
    if (resid !== shared) faults.push(`<${user.name}> uses ${resid}, but the shared runtime is ${shared}`);
  }
}

function checkIcons(elements: readonly XmlElement[], faults: string[]): void {
  for (const icon of elements.filter((element) => element.name === 'Icon')) {
    const sizes = icon.children.map((image) => image.attributes.get('size'));
    for (const size of RIBBON_ICON_SIZES) {
      if (!sizes.includes(size)) faults.push(`<Icon> has no image of ${size} pixels`);
    }
  }
}

function checkSets(elements: readonly XmlElement[], faults: string[]): void {
  const sets = elements.filter((element) => element.name === 'Set');
  for (const [name, version] of Object.entries(NEEDED_SETS)) {
    const found = sets.find((set) => set.attributes.get('Name') === name)?.attributes.get('MinVersion');
    if (found !== version) {
      faults.push(`<Set Name="${name}"> must ask for version ${version}, but asks for ${found ?? 'nothing'}`);
    }
  }
}

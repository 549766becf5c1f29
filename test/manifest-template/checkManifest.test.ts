import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from '@jest/globals';
import { validateXML } from 'xmllint-wasm';
import { checkManifest } from '../../manifest-template/checkManifest.ts';
import { readXml } from '../../manifest-template/readXml.ts';
import { writeManifest } from '../../manifest-template/writeManifest.ts';

const templates = join(process.cwd(), 'manifest-template');
const schemas = join(process.cwd(), 'test', 'schemas', 'office-manifest-xsd');
const manifest = writeManifest(templates, 'https://tools.example.org/tautline', '1.4.2');

/** Sentences of the schema's validator, none when the manifest is valid. Runs offline. */
async function schemaFaults(xml: string): Promise<string[]> {
  const read = (fileName: string) => ({ fileName, contents: readFileSync(join(schemas, fileName), 'utf8') });
  const { errors } = await validateXML({
    xml: [{ fileName: 'manifest.xml', contents: xml }],
    schema: [read('OfficeAppManifestV1_1.xsd')],
    preload: [
      'OfficeAppBasicTypesV1_0.xsd',
      'MailAppVersionOverridesV1_0.xsd',
      'MailAppVersionOverridesV1_1.xsd',
      'TaskPaneAppVersionOverridesV1_0.xsd',
    ].map(read),
  });
  return errors.map(({ message }) => message);
}

/** The manifest with one piece changed; a change that finds nothing to change is a mistake of the test. */
function changed(find: string | RegExp, put: string): string {
  const result = manifest.replace(find, put);
  if (result === manifest) throw new Error(`the manifest has no ${String(find)}`);
  return result;
}

describe('the manifest', () => {
  test('is valid by the published schemas (MS-OWEMXML)', async () => {
    expect(await schemaFaults(manifest)).toEqual([]);
  });

  test('passes the checks that the schema lacks', () => {
    expect(checkManifest(manifest)).toEqual([]);
  });

  test('the schema check can fail', async () => {
    const faults = await schemaFaults(changed('<Permissions>ReadWriteDocument', '<Permissions>Everything'));
    expect(faults.join()).toContain('Permissions');
    expect(await schemaFaults(changed(/<bt:Url id="Functions.Script.Url"[^>]*>/, '<bt:Url/>'))).not.toEqual(
      [],
    );
  });

  test('carries the address and the version', () => {
    expect(manifest).toContain('<Version>1.4.2</Version>');
    expect(manifest).toContain('DefaultValue="https://tools.example.org/tautline/functions.js"');
    expect(manifest).not.toContain('localhost');
    expect(manifest).not.toContain('{{');
  });

  test('keeps its identity: hosts know the add-in by it', () => {
    expect(manifest).toContain('<Id>9142b9d2-0521-443f-86a0-c2757260c518</Id>');
  });

  test('is refused with a version that hosts cannot read', () => {
    expect(() => writeManifest(templates, 'https://tools.example.org', '1.0.0-beta')).toThrow('four parts');
  });
});

describe('checkManifest', () => {
  const longText = 'x'.repeat(126);
  test.each<[string, string | RegExp, string, string]>([
    ['no SupportUrl', /<SupportUrl[^>]*>/, '', '<SupportUrl> is missing'],
    ['no IconUrl', /<IconUrl[^>]*>/, '', '<IconUrl> is missing'],
    ['no HighResolutionIconUrl', /<HighResolutionIconUrl[^>]*>/, '', '<HighResolutionIconUrl> is missing'],
    ['no Metadata', /<Metadata>[\s\S]*<\/Metadata>/, '', '<Metadata> is missing'],
    ['no Namespace', /<Namespace[^>]*>/, '', '<Namespace> is missing'],
    ['no Runtimes', /<Runtimes>[\s\S]*<\/Runtimes>/, '', '<Runtimes> is missing'],
    ['no 80 pixel icon', /<bt:Image size="80"[^>]*>/, '', '<Icon> has no image of 80 pixels'],
    [
      'a resid that leads nowhere',
      '<Title resid="Button.Label"/>',
      '<Title resid="Gone"/>',
      'resid Gone leads nowhere',
    ],
    [
      'an unused resource',
      '<bt:Images>',
      '<bt:Images><bt:Image id="Odd" DefaultValue="https://a/b"/>',
      'Odd is never used',
    ],
    [
      'an id defined twice',
      '<bt:Images>',
      '<bt:Images><bt:Image id="Icon.16" DefaultValue="https://a/b"/>',
      'Icon.16 is defined twice',
    ],
    ['a plain http address', 'DefaultValue="https://tools', 'DefaultValue="http://tools', 'must use https:'],
    ['a long id', /Tautline\.ShowPanel/, 'T'.repeat(33), 'longer than 32 characters'],
    [
      'a long short text',
      'DefaultValue="Tautline is ready"',
      `DefaultValue="${longText}"`,
      '126 characters, more than 125',
    ],
    ['a long long text', 'DefaultValue="Open the', `DefaultValue="${longText}${longText}`, 'more than 250'],
    ['five version parts', '<Version>1.4.2', '<Version>1.4.2.0.1', '<Version> must be'],
    ['six digits in a version part', '<Version>1.4.2', '<Version>123456', '<Version> must be'],
    ['a short-lived runtime', 'lifetime="long"', 'lifetime="short"', 'lifetime="long"'],
    [
      'a page of its own for commands',
      '<FunctionFile resid="Page.Url"/>',
      '<FunctionFile resid="Help.Url"/>',
      'the shared runtime is Page.Url',
    ],
    [
      'a TaskpaneId',
      '<Action xsi:type="ShowTaskpane">',
      '<Action xsi:type="ShowTaskpane"><TaskpaneId>a</TaskpaneId>',
      '<TaskpaneId> must be left out',
    ],
    [
      'an older host interface',
      'Name="ExcelApi" MinVersion="1.12"',
      'Name="ExcelApi" MinVersion="1.1"',
      'must ask for version 1.12',
    ],
    ['no shared runtime asked for', /<Set Name="SharedRuntime"[^>]*>/, '', 'asks for nothing'],
    [
      'Runtimes after the form factors',
      /(<Runtimes>[\s\S]*<\/Runtimes>)([\s\S]*<\/AllFormFactors>)/,
      '$2$1',
      'must come first',
    ],
  ])('finds %s', (_what, find, put, fault) => {
    expect(checkManifest(changed(find, put)).join('\n')).toContain(fault);
  });
});

describe('readXml', () => {
  test('reads names, attributes, text and entities', () => {
    const xml = `<?xml version="1.0"?><!-- <no/> --><a b='1 &amp; 2'>t<c:d e="&lt;"/></a>`;
    const { name, attributes, text, children } = readXml(xml);
    expect([name, attributes.get('b'), text, children[0]?.attributes.get('e')]).toEqual([
      'a',
      '1 & 2',
      't',
      '<',
    ]);
  });

  test.each(['<a>', '<a></b>', '<a/><b/>', '<a', '', 'text'])('refuses %s', (xml) => {
    expect(() => readXml(xml)).toThrow();
  });
});

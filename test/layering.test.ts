import { readdirSync, readFileSync } from 'node:fs';
import { isBuiltin } from 'node:module';
import { join, relative, resolve } from 'node:path';
import { describe, expect, test } from '@jest/globals';
import ts from 'typescript';

const root = process.cwd();
const SHIPPED = ['core', 'functions', 'taskpane'] as const;

interface Import {
  /** Path of the importing file from the top folder. */
  readonly from: string;
  readonly specifier: string;
}

/** Every import of a source text: static, re-exported, dynamic, `require`, `import x = require()`, and types. */
function importsOf(from: string, text: string): Import[] {
  const kind = from.endsWith('.tsx') ? ts.ScriptKind.TSX : ts.ScriptKind.TS;
  const specifiers: string[] = [];
  const visit = (node: ts.Node): void => {
    const literal = specifierOf(node);
    if (literal !== undefined) specifiers.push(literal);
    ts.forEachChild(node, visit);
  };
  visit(ts.createSourceFile(from, text, ts.ScriptTarget.Latest, true, kind));
  return specifiers.map((specifier) => ({ from, specifier }));
}

function specifierOf(node: ts.Node): string | undefined {
  if (ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) return textOf(node.moduleSpecifier);
  if (ts.isExternalModuleReference(node)) return textOf(node.expression);
  if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) return textOf(node.argument.literal);
  if (!ts.isCallExpression(node)) return undefined;
  const called = node.expression;
  const loads =
    called.kind === ts.SyntaxKind.ImportKeyword || (ts.isIdentifier(called) && called.text === 'require');
  if (!loads) return undefined;
  // A computed specifier could reach anything: it is reported as itself, which no rule allows.
  return textOf(node.arguments[0]) ?? `computed: ${node.arguments[0]?.getText() ?? ''}`;
}

function textOf(node: ts.Node | undefined): string | undefined {
  return node !== undefined && ts.isStringLiteralLike(node) ? node.text : undefined;
}

function sourcesBelow(folder: string): string[] {
  return readdirSync(join(root, folder), { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile() && /\.(ts|tsx|mts|cts|js|mjs|jsx)$/.test(entry.name))
    .map((entry) => relative(root, join(entry.parentPath, entry.name)).replaceAll('\\', '/'));
}

/** Where an import leads: a top folder of this project, or a package's name. */
function targetOf({ from, specifier }: Import): string {
  if (specifier.startsWith('.')) {
    const path = relative(root, resolve(root, from, '..', specifier)).replaceAll('\\', '/');
    return `${path.split('/')[0]}/`;
  }
  if (isBuiltin(specifier)) return `node:${specifier.replace(/^node:/, '')}`;
  return specifier
    .split('/')
    .slice(0, specifier.startsWith('@') ? 2 : 1)
    .join('/');
}

const about: unknown = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));
const dependencies =
  typeof about === 'object' && about !== null && 'dependencies' in about
    ? Object.keys(about.dependencies ?? {})
    : [];

const ALLOWED: Readonly<Record<(typeof SHIPPED)[number], readonly string[]>> = {
  core: ['core/'],
  functions: ['functions/', 'core/'],
  taskpane: ['taskpane/', 'core/', 'preact', '@observablehq/plot'],
};

/** Imports that break the rule of their folder. */
function breaches(imports: readonly Import[]): string[] {
  return imports.flatMap((one) => {
    const layer = SHIPPED.find((folder) => one.from.startsWith(`${folder}/`));
    if (layer === undefined || ALLOWED[layer].includes(targetOf(one))) return [];
    return [`${one.from} imports ${one.specifier}`];
  });
}

describe('who may import whom', () => {
  test.each(SHIPPED)('%s keeps to its own', (layer) => {
    const files = sourcesBelow(layer);
    expect(files.length).toBeGreaterThan(0);
    const imports = files.flatMap((file) => importsOf(file, readFileSync(join(root, file), 'utf8')));
    expect(breaches(imports)).toEqual([]);
  });

  test('the packages that shipped code may use are run-time dependencies', () => {
    const packages = Object.values(ALLOWED).flatMap((targets) =>
      targets.filter((target) => !target.endsWith('/')),
    );
    for (const name of packages) expect(dependencies).toContain(name);
  });

  test.each([
    ['core/a.ts', "import { x } from '../functions/b.ts';"],
    ['core/law/a.ts', "export * from '../../taskpane/b.tsx';"],
    ['core/a.ts', "import type { y } from '../test/b.ts';"],
    ['core/a.ts', "import { z } from 'preact';"],
    ['core/a.ts', "import { jStat } from 'jstat';"],
    ['core/a.ts', "import { Matrix } from 'ml-matrix';"],
    ['core/a.ts', "import fs from 'node:fs';"],
    ['core/a.ts', "const fs = require('fs');"],
    ['core/a.ts', 'const later = import(`../functions/b.ts`);'],
    ['core/a.ts', 'const later = import(name);'],
    ['core/a.ts', "let t: import('../functions/b.ts').T;"],
    ['core/a.ts', "import old = require('../taskpane/b.ts');"],
    ['functions/a.ts', "import { x } from '../taskpane/b.tsx';"],
    ['functions/a.ts', "import 'fast-check';"],
    ['taskpane/views/a.tsx', "const p = <p/>; import { x } from '../../functions/b.ts';"],
    ['taskpane/a.tsx', "import React from 'react';"],
    ['taskpane/a.tsx', "import { inner } from '@observablehq/other';"],
  ])('the rule catches, in %s: %s', (from, text) => {
    expect(breaches(importsOf(from, text))).toHaveLength(1);
  });

  test.each([
    ['core/law/a.ts', "import { b } from '../line/b.ts'; import './c.ts';"],
    [
      'functions/a.ts',
      "import { b } from '../core/b.ts'; const text = \"import 'react'\"; // import 'react'",
    ],
    [
      'taskpane/a.tsx',
      "import { h } from 'preact'; import { useState } from 'preact/hooks'; import '../core/b.ts';",
    ],
  ])('the rule lets pass, in %s: %s', (from, text) => {
    expect(breaches(importsOf(from, text))).toEqual([]);
  });
});

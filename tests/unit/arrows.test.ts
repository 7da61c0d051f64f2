import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { isBuiltin } from 'node:module';
import path from 'node:path';
import ts from 'typescript';
import { describe, expect, test } from 'vitest';
import { clientMayImport, mayImportFile, mayImportPackage, pureRooms, roomOf, rooms } from '../harness/arrows.mjs';

const root = path.resolve(import.meta.dirname, '..', '..');
const folders = ['app', 'engine', 'grammar', 'lib', 'models', 'migrations', 'seeders', 'tests'];
const endings = ['', '.ts', '.tsx', '.mjs', '.css', '.json', '/index.ts', '/index.tsx'];

const files = folders.flatMap((folder) =>
  readdirSync(path.join(root, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.(ts|tsx|mjs)$/.test(entry.name))
    .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name))),
);
const known = new Set(files);

interface Imports {
  /** Files of the project that exist when this one runs. */
  readonly files: readonly string[];
  /** Files of which only types are used. */
  readonly types: readonly string[];
  readonly packages: readonly string[];
}

/** The file a specifier names. The path itself when it is none of the scanned kinds (a style sheet, say). */
function locate(from: string, specifier: string): string {
  const base = specifier.startsWith('@/') ? specifier.slice(2) : path.join(path.dirname(from), specifier);
  return endings.map((ending) => base + ending).find((candidate) => known.has(candidate)) ?? base;
}

/** Every import of a file, read from its syntax tree: static, re-exported, dynamic and in types. */
function importsOf(file: string): Imports {
  const source = ts.createSourceFile(file, readFileSync(path.join(root, file), 'utf8'), ts.ScriptTarget.Latest, true);
  const found = { files: [] as string[], types: [] as string[], packages: [] as string[] };
  const note = (specifier: string, typeOnly: boolean) => {
    if (specifier.startsWith('.') || specifier.startsWith('@/')) {
      (typeOnly ? found.types : found.files).push(locate(file, specifier));
    } else if (isBuiltin(specifier)) found.packages.push('node');
    else found.packages.push(specifier.split('/', specifier.startsWith('@') ? 2 : 1).join('/'));
  };
  const visit = (node: ts.Node): void => {
    if (ts.isImportDeclaration(node) && ts.isStringLiteral(node.moduleSpecifier)) {
      const bindings = node.importClause?.namedBindings;
      const allTypes =
        bindings !== undefined &&
        ts.isNamedImports(bindings) &&
        bindings.elements.length > 0 &&
        node.importClause?.name === undefined &&
        bindings.elements.every((element) => element.isTypeOnly);
      note(node.moduleSpecifier.text, node.importClause?.isTypeOnly === true || allTypes);
    } else if (ts.isExportDeclaration(node) && node.moduleSpecifier !== undefined) {
      if (ts.isStringLiteral(node.moduleSpecifier)) note(node.moduleSpecifier.text, node.isTypeOnly);
    } else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
      const [specifier] = node.arguments;
      if (specifier !== undefined && ts.isStringLiteral(specifier)) note(specifier.text, false);
    } else if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) {
      if (ts.isStringLiteral(node.argument.literal)) note(node.argument.literal.text, true);
    }
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found;
}

const imports = new Map(files.map((file) => [file, importsOf(file)]));
const every = [...imports].flatMap(([file, found]) =>
  [...found.files, ...found.types].map((target) => ({ file, target })),
);

describe('rooms and arrows', () => {
  test('every source file lies in a room', () => {
    expect(files.filter((file) => roomOf(file) === undefined)).toEqual([]);
  });

  test('every room is there', () => {
    const there = (room: string) => ['', '.ts'].some((ending) => existsSync(path.join(root, room + ending)));
    expect(rooms.map(({ room }) => room).filter((room) => !there(room))).toEqual([]);
  });

  test('no import goes against an arrow', () => {
    const crossed = every.filter(({ file, target }) => !mayImportFile(file, target));
    expect(crossed.map(({ file, target }) => `${file} → ${target}`)).toEqual([]);
  });

  test('no room uses a package it may not use', () => {
    const crossed = [...imports].flatMap(([file, found]) =>
      found.packages.filter((name) => !mayImportPackage(file, name)).map((name) => `${file} → ${name}`),
    );
    expect(crossed).toEqual([]);
  });

  test('the rooms of the engine form no circle', () => {
    const before = new Map(
      rooms.map(({ room, rooms: targets }) => [room, targets.filter((target) => target !== room)]),
    );
    const reach = (room: string, seen: ReadonlySet<string>): boolean =>
      (before.get(room) ?? []).some((target) => seen.has(target) || reach(target, new Set([...seen, target])));
    const pure = rooms
      .map(({ room }) => room)
      .filter((room) => pureRooms.some((pureRoom) => room.startsWith(pureRoom)));
    expect(pure.filter((room) => reach(room, new Set([room])))).toEqual([]);
  });
});

describe('code that runs in the browser', () => {
  const text = (file: string) => readFileSync(path.join(root, file), 'utf8');
  const isAction = (file: string) => /^\s*(['"])use server\1/.test(text(file));
  const declared = files.filter((file) => file.startsWith('app/') && /^\s*(['"])use client\1/.test(text(file)));
  // What a client component imports is client code too, whether it says so or not; an action of the server is only called.
  const reached = new Set(declared);
  for (const file of reached)
    for (const target of imports.get(file)?.files ?? [])
      if (known.has(target) && !isAction(target)) reached.add(target);

  test('imports nothing of the server', () => {
    const crossed = [...reached].flatMap((file) =>
      (imports.get(file)?.files ?? [])
        .filter((target) => !clientMayImport(target))
        .map((target) => `${file} → ${target}`),
    );
    expect(crossed).toEqual([]);
  });

  test('uses none of Node’s modules and nothing marked as server code', () => {
    const forbidden = new Set(['node', 'server-only', 'sequelize', 'pg', 'piscina']);
    const crossed = [...reached].flatMap((file) =>
      (imports.get(file)?.packages ?? []).filter((name) => forbidden.has(name)).map((name) => `${file} → ${name}`),
    );
    expect(crossed).toEqual([]);
  });
});

describe('the engine decides nothing by clock or chance', () => {
  const command = 'grammar/write-source.ts';
  const pure = files.filter((file) => file !== command && pureRooms.some((room) => file.startsWith(`${room}/`)));
  const impure = new Set(['Date', 'performance', 'process', 'Buffer', 'parseFloat', 'toFixed']);
  const impureMath = new Set([
    'random',
    'sqrt',
    'log',
    'log2',
    'log10',
    'exp',
    'pow',
    'floor',
    'ceil',
    'round',
    'trunc',
  ]);

  test('no name of a clock, of chance or of floating point stands in it', () => {
    const found: string[] = [];
    for (const file of pure) {
      const source = ts.createSourceFile(
        file,
        readFileSync(path.join(root, file), 'utf8'),
        ts.ScriptTarget.Latest,
        true,
      );
      const visit = (node: ts.Node): void => {
        if (ts.isIdentifier(node)) {
          const owner =
            ts.isPropertyAccessExpression(node.parent) && node.parent.name === node
              ? node.parent.expression
              : undefined;
          const mathematics = owner !== undefined && ts.isIdentifier(owner) && owner.text === 'Math';
          if (
            mathematics
              ? impureMath.has(node.text)
              : impure.has(node.text) && (owner === undefined || node.text === 'toFixed')
          ) {
            found.push(`${file}: ${node.text}`);
          }
        }
        ts.forEachChild(node, visit);
      };
      visit(source);
    }
    expect(found).toEqual([]);
  });
});

// The lint rule that keeps the arrows of arrows.mjs.
import { isBuiltin } from 'node:module';
import path from 'node:path';
import { clientMayImport, mayImportFile, mayImportPackage } from './arrows.mjs';

const packageName = (specifier) => specifier.split('/', specifier.startsWith('@') ? 2 : 1).join('/');

/** What a specifier names: a file of the project by its path from the root, or a package. */
function resolve(root, file, specifier) {
  if (specifier.startsWith('@/')) return { file: specifier.slice(2) };
  if (!specifier.startsWith('.')) return { package: isBuiltin(specifier) ? 'node' : packageName(specifier) };
  const target = path.relative(root, path.resolve(path.dirname(path.join(root, file)), specifier));
  return { file: target.split(path.sep).join('/') };
}

export const arrows = {
  meta: { type: 'problem', schema: [], messages: { crossed: '{{message}}' } },
  create(context) {
    const root = context.cwd;
    const file = path.relative(root, context.filename).split(path.sep).join('/');
    let client = false;
    const check = (source) => {
      if (typeof source?.value !== 'string') return;
      const target = resolve(root, file, source.value);
      const report = (message) => context.report({ node: source, messageId: 'crossed', data: { message } });
      if (target.package !== undefined) {
        if (!mayImportPackage(file, target.package)) report(`${file} may not import the package ${target.package}.`);
        if (client && target.package === 'node') report(`${file} runs in the browser, where Node's modules are not.`);
        return;
      }
      if (!mayImportFile(file, target.file)) report(`${file} may not import ${target.file}: no arrow leads there.`);
      else if (client && !clientMayImport(target.file)) {
        report(`${file} runs in the browser and may not import ${target.file}.`);
      }
    };
    return {
      Program(program) {
        client = program.body.some((statement) => statement.directive === 'use client');
      },
      ImportDeclaration: (node) => check(node.source),
      ExportNamedDeclaration: (node) => check(node.source),
      ExportAllDeclaration: (node) => check(node.source),
      ImportExpression: (node) => check(node.source),
      TSImportType: (node) => check(node.source ?? node.argument?.literal),
    };
  },
};

// What is wrong with JSON-LD by the types and properties of schema.org, as the package schema-dts gives them to TypeScript.

import { posix } from 'node:path';
import ts from 'typescript';
import { top } from '../house/sources.ts';

/** Types at the top of our JSON-LD. */
const types = ['DataCatalog', 'Dataset'] as const;

/**
 * Problems of JSON-LD values, each "value number: what the compiler says"; empty where there are none. Every value is written as a
 * literal of its own type, so that an unknown type, an unknown property of a type and a value of the wrong kind are all found, at any depth.
 */
export function schemaOrgProblems(values: readonly unknown[]): readonly string[] {
  const file = posix.join(top.replaceAll('\\', '/'), 'tests/schemas/json-ld.ts');
  const lines = values.map((value, index) => `export const value${index}: WithContext<${typeOf(value)}> = ${JSON.stringify({ ...(value as object), '@context': 'https://schema.org' })};`);
  const text = [`import type { ${types.join(', ')}, WithContext } from 'schema-dts';`, ...lines].join('\n');
  const options: ts.CompilerOptions = { strict: true, noEmit: true, skipLibCheck: true, module: ts.ModuleKind.ESNext, moduleResolution: ts.ModuleResolutionKind.Bundler, target: ts.ScriptTarget.ES2022, types: [] };
  const host = ts.createCompilerHost(options);
  const { getSourceFile, fileExists, readFile } = host;
  host.getSourceFile = (name, target, ...rest) => (name === file ? ts.createSourceFile(name, text, target) : getSourceFile(name, target, ...rest));
  host.fileExists = (name) => name === file || fileExists(name);
  host.readFile = (name) => (name === file ? text : readFile(name));
  return ts.getPreEmitDiagnostics(ts.createProgram([file], options, host)).map(({ file: where, start, messageText }) =>
    `value ${where === undefined ? '' : ts.getLineAndCharacterOfPosition(where, start ?? 0).line}: ${deepest(messageText)}`);
}

function typeOf(value: unknown): string {
  const type = (value as { readonly '@type'?: unknown })['@type'];
  return types.find((one) => one === type) ?? 'Dataset';
}

/** The innermost reason: the outer ones repeat the whole value. */
function deepest(message: string | ts.DiagnosticMessageChain): string {
  if (typeof message === 'string') return message;
  return message.next === undefined ? message.messageText : deepest(message.next.at(-1)!);
}

import { readFileSync } from 'node:fs';
import { Ajv } from 'ajv';
import { Ajv2020 } from 'ajv/dist/2020.js';
import type { XmlElement } from './readXml.ts';

function kept(name: string): unknown {
  return JSON.parse(readFileSync(new URL(name, import.meta.url), 'utf8'));
}

const formats = {
  uri: (text: string): boolean => URL.canParse(text),
  date: (text: string): boolean => {
    const day = new Date(/^\d{4}-\d{2}-\d{2}$/.test(text) ? `${text}T00:00:00Z` : Number.NaN);
    return !Number.isNaN(day.getTime()) && day.toISOString().startsWith(text);
  },
};

/** What is wrong with a value under a kept schema, "path: message"; empty where nothing is. */
export function problemsUnder(name: string, value: unknown): readonly string[] {
  return problems(new Ajv({ allErrors: true, strict: false, formats }), kept(name) as object, value);
}

/** The same under a schema of our own (2020-12). */
export function problemsUnderOwn(schema: object, value: unknown): readonly string[] {
  return problems(new Ajv2020({ allErrors: true, strict: false, validateFormats: false }), schema, value);
}

/** Compiled once a schema: that takes far longer than a check. */
const compiled = new WeakMap<object, ReturnType<Ajv['compile']>>();

function problems(ajv: Pick<Ajv, 'compile'>, schema: object, value: unknown): readonly string[] {
  const check = compiled.get(schema) ?? ajv.compile(schema);
  compiled.set(schema, check);
  check(value);
  return (check.errors ?? []).map(({ instancePath, message }) => `${instancePath}: ${message}`);
}

interface ElementRule {
  readonly needs?: readonly string[];
  readonly may?: readonly string[];
  readonly once?: boolean;
  readonly ordered?: boolean;
  readonly text?: string;
  readonly attributes?: readonly string[];
  readonly needsAttributes?: readonly string[];
  readonly values?: Readonly<Record<string, readonly string[]>>;
}

/** What is wrong with an XML element under kept rules for elements. */
export function elementProblems(name: string, root: XmlElement): readonly string[] {
  const rules = kept(name) as { readonly root: string; readonly namespace: string; readonly elements: Readonly<Record<string, ElementRule>> };
  const found = root.name === rules.root && root.attributes['xmlns'] === rules.namespace ? [] : [`the root is ${root.name} of ${root.attributes['xmlns']}`];
  return [...found, ...ofElement(root, rules.elements)];
}

function ofElement(element: XmlElement, rules: Readonly<Record<string, ElementRule>>): string[] {
  const rule = rules[element.name];
  if (rule === undefined) return [`no element ${element.name}`];
  const allowed = [...(rule.needs ?? []), ...(rule.may ?? [])];
  const names = element.children.map(({ name }) => name);
  const say = (what: string): string => `${element.name}: ${what}`;
  return [
    ...(rule.needs ?? []).filter((child) => !names.includes(child)).map((child) => say(`no ${child}`)),
    ...names.filter((child) => !allowed.includes(child)).map((child) => say(`a ${child} within`)),
    ...(rule.once === true && new Set(names).size !== names.length ? [say('an element twice')] : []),
    ...(rule.ordered === true && names.some((child, index) => index > 0 && allowed.indexOf(child) < allowed.indexOf(names[index - 1]!)) ? [say('elements out of order')] : []),
    ...(rule.text !== undefined && !new RegExp(`^(?:${rule.text})$`, 's').test(element.text) ? [say(`"${element.text}"`)] : []),
    ...(rule.text === undefined && element.text !== '' ? [say('text between elements')] : []),
    ...(rule.needsAttributes ?? []).filter((attribute) => !(attribute in element.attributes)).map((attribute) => say(`no ${attribute}`)),
    ...Object.entries(element.attributes).flatMap(([attribute, value]) => [
      ...((rule.attributes ?? []).includes(attribute) ? [] : [say(`an attribute ${attribute}`)]),
      ...((rule.values?.[attribute] ?? [value]).includes(value) ? [] : [say(`${attribute} "${value}"`)]),
    ]),
    ...element.children.flatMap((child) => ofElement(child, rules)),
  ];
}

// Cells that hold more than one text: ligands, candidates for a term, hazard cautions that do not apply.

import type { TypedComplex, TypedLigandCount } from '#engine';

type Ligands = NonNullable<TypedComplex['ligands']>;

/** "5 ammine + 1 chlorido", "ammine: 5, chlorido: 1", "2 oxalato (1 bound)"; null where a part cannot be read so. */
export function ligandsFromCell(content: string): Ligands | null {
  const result: Record<string, TypedLigandCount> = {};
  for (const part of content.replace(/^\{|\}$/g, '').split(/[+,;&]/)) {
    const found = /^\s*(?:(\d+)\s*[x×]?\s*([a-z][a-z0-9-]*)|([a-z][a-z0-9-]*)\s*(?::|=|\s)\s*(\d+)|([a-z][a-z0-9-]*))\s*(?:\((\d+) bound\))?\s*$/i.exec(part);
    const id = (found?.[2] ?? found?.[3] ?? found?.[5])?.toLowerCase();
    if (found === null || id === undefined || Object.hasOwn(result, id)) return null;
    const count = found[1] ?? found[4] ?? '1';
    result[id] = found[6] === undefined ? count : { count, bound: found[6] };
  }
  return result;
}

export function ligandsCell(ligands: Ligands): string {
  return Object.entries(ligands).map(([id, typed]) => {
    if (typeof typed === 'string') return `${typed} ${id}`;
    return `${typed.count} ${id}${typed.bound == null ? '' : ` (${typed.bound} bound)`}`;
  }).join(' + ');
}

/** "4T1g(F) or CT" as a list of candidates, one label as a text. */
export function termsFromCell(content: string): string | readonly string[] {
  const terms = content.split(/\s+or\s+|\s*\|\s*/).filter((term) => term !== '');
  return terms.length === 1 ? terms[0]! : terms;
}

/** "PERCHLORATE: never dry; AZIDE: not isolated"; null where a part names no code. */
export function hazardsFromCell(content: string): Readonly<Record<string, string>> | null {
  const parts = content.split(/;\s*(?=[A-Z][A-Z0-9_-]*:)/).map((part) => /^\s*([A-Z][A-Z0-9_-]*):\s*(.+)$/s.exec(part));
  return parts.some((part) => part === null) ? null : Object.fromEntries(parts.map((part) => [part![1]!, part![2]!.trim()]));
}

export function hazardsCell(hazards: Readonly<Record<string, string>>): string {
  return Object.entries(hazards).map(([code, reason]) => `${code}: ${reason}`).join('; ');
}

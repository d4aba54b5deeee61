import { NOT_RECORDED } from './show.ts';
import type { SourceRow } from './rows.ts';
import { words } from './table.ts';
import type { CollectionTree, MeasurementNode } from './tree.ts';
import { type Parts, formulaShown } from './typeset.ts';

export interface Origin {
  readonly facts: readonly { readonly name: string; readonly value: Parts; readonly address?: string }[];
}

/** Where a measurement came from; what was not recorded says so where a reader would ask. */
export function measurementOrigin(tree: CollectionTree, { row }: MeasurementNode): Origin {
  const source = row.source === null ? null : tree.sources.get(row.source) ?? null;
  const fact = (name: string, value: string) => ({ name, value: words(value) });
  const optional = (name: string, value: string | null) => value === null ? [] : [fact(name, value)];
  const address = source === null ? undefined : sourceAddress(source);
  return {
    facts: [
      ...(source === null
        ? [fact('Notebook', row.notebook ?? NOT_RECORDED), fact('Measured by', person(tree, row.measured_by)), fact('Date', row.measured_on ?? NOT_RECORDED)]
        : [{ ...fact('Source', `${source.reference}${row.source_place ? ` (${row.source_place})` : ''}`), ...(address === undefined ? {} : { address }) }]),
      { name: 'Sample', value: row.sample === null ? words(NOT_RECORDED) : formulaShown(row.sample, 'none', tree.abbreviations).parts },
      fact('Temperature', row.temperature_typed === null ? NOT_RECORDED : `typed “${row.temperature_typed}”${row.temperature_assumed === 1 ? ', value assumed' : ''}`),
      fact('Technique', row.technique ?? NOT_RECORDED),
      ...optional('Host', row.host), ...optional('Concentration', row.concentration), ...optional('Path length', row.path_length), ...optional('Batch', row.batch),
      ...optional('Magnetic moment', row.magnetic_moment), ...optional('EPR g', row.epr_g),
      fact('Raw file', row.raw_file === null ? NOT_RECORDED : `${row.raw_file}${row.raw_hash ? `, hash ${row.raw_hash}` : ''}`),
      ...optional('Policy overridden', row.policy_reason === null ? null : `${row.policy}: ${row.policy_reason}`),
    ],
  };
}

function person(tree: CollectionTree, initials: string | null): string {
  if (initials === null) return NOT_RECORDED;
  return tree.people.find((one) => one.initials === initials)?.name ?? initials;
}

export function sourceAddress({ doi, url }: SourceRow): string | undefined {
  if (doi !== null) return `https://doi.org/${doi}`;
  return url !== null && /^https?:\/\//.test(url) ? url : undefined;
}

// Published addresses are for good: what vanished without a word, came back as something else, or leads nowhere is a fault.

import type { ComplexRecord, Fault, LigandRecord } from '../content/types.ts';
import { releaseFolder } from './readHistory.ts';
import { firstReleases } from './rows.ts';
import { addressesOf } from './snapshot.ts';
import type { FrozenComplex, Gone, History } from './types.ts';

type Identity = Pick<FrozenComplex, 'id' | 'formula' | 'ion' | 'geometry' | 'isomer'>;

/** A complex with the measurements that have addresses. */
type Addressed = Identity & { readonly measurements: readonly { readonly id: string }[] };

/** Faults of a collection against its own history. Nothing needs to be fitted for it. */
export function permanenceFaults({ releases, gone }: History, complexes: readonly Addressed[], ligands: readonly Pick<LigandRecord, 'id'>[]): readonly Fault[] {
  const entries = new Map(gone.map((entry) => [entry.address, entry]));
  const now = new Set(addressesOf(complexes, ligands.map(({ id }) => id)));
  const byId = new Map(complexes.map((complex) => [complex.id, complex]));
  return [
    ...[...firstReleases(releases)].flatMap(([address, release]) => vanished(address, release, now, entries)),
    ...gone.flatMap((entry) => [...reused(entry, now), ...leadsNowhere(entry, now)]),
    ...(releases.at(-1)?.complexes ?? []).flatMap((complex) => changedIdentity(complex, byId.get(complex.id), entries)),
  ];
}

export function identitiesOf(complexes: readonly ComplexRecord[]): readonly Addressed[] {
  return complexes.map(({ id, formula, ion, geometryName, isomer, measurements }) => ({ id, formula, ion: ion.name, geometry: geometryName, isomer, measurements }));
}

const goneFile = `${releaseFolder}/gone.yaml`;

function fault(file: string, code: string, found: string, expected: string, mend: string): Fault {
  return { file, line: 1, column: 1, field: '', code, found, expected, mend };
}

function vanished(address: string, release: string, now: ReadonlySet<string>, entries: ReadonlyMap<string, Gone>): Fault[] {
  const page = address.replace(/#.*$/, '');
  // Of a page that is gone with all its places, only the page is told.
  if (now.has(address) || entries.has(address) || (page !== address && !now.has(page))) return [];
  return [fault(goneFile, 'ADDRESS_VANISHED', `nothing at ${address}, which release ${release} published`, 'a record at this address, or an entry that says what became of it',
    `bring the record back, or write under gone:  - { address: "${address}", reason: "why it was taken away" }  or, where it was renamed,  - { address: "${address}", now: "its new address" }`)];
}

function reused({ address, kind }: Gone, now: ReadonlySet<string>): Fault[] {
  if (kind === 'corrected' || !now.has(address)) return [];
  return [fault(goneFile, 'ID_REUSED', `a record at ${address}, which is declared gone`, 'an id of its own for a new record: a published id is never given to another', 'rename the new record, or delete the entry where the old record is back')];
}

function leadsNowhere({ address, target }: Gone, now: ReadonlySet<string>): Fault[] {
  if (target === null || now.has(target)) return [];
  return [fault(goneFile, 'GONE_ADDRESS', `${address} leads to ${target}, where there is nothing`, 'the address of a record that is there', 'correct the address behind successor: or now:')];
}

function changedIdentity(before: Identity, after: Identity | undefined, entries: ReadonlyMap<string, Gone>): Fault[] {
  const address = `complexes/${before.id}/`;
  if (after === undefined || entries.get(address)?.kind === 'corrected') return [];
  const told = ({ formula, ion, geometry, isomer }: Identity): string => `${formula}, ${ion}, ${geometry}${isomer === 'none' ? '' : `, ${isomer}`}`;
  const same = after.ion === before.ion && after.geometry === before.geometry && after.isomer === before.isomer && squeezed(after.formula) === squeezed(before.formula);
  return same ? [] : [fault(`complexes/${before.id}.yaml`, 'IDENTITY_CHANGED', told(after), `${told(before)}, as it was published under this id`,
    `give a new complex a new id; where the old record was mistaken, write in ${goneFile}:  - { address: "${address}", corrected: "what was wrong" }`)];
}

function squeezed(formula: string): string {
  return formula.replace(/\s+/g, '');
}

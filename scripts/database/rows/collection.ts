import { freeIon, policyId } from '#engine';
import type { FreeIonSetName, Ion, Policy } from '#engine';
import type { Collection, Group, LigandRecord, SourceRecord } from '../../content/types.ts';
import type { ComplexFacts } from './complexResult.ts';
import { flag, list } from './row.ts';
import type { Row, Tables } from './row.ts';

export const freeIonSetNames: readonly FreeIonSetName[] = ['published', 'atomic-levels'];

/** A collection without its complexes. */
export type CollectionFrame = Omit<Collection, 'complexes'>;

/** Rows of what a collection holds beside its complexes: meta, people, sources, ligands, the policy in force. */
export function frameRows(frame: CollectionFrame, engineHash: string, software: string): Tables {
  return {
    meta: metaRows(frame.group, engineHash, software),
    person: frame.group.people.map((person, index) => ({
      number: index + 1, name: person.name, orcid: person.orcid, initials: person.initials,
    })),
    policy: [policyRow(frame.policyId, frame.policy, true)],
    source: frame.sources.map(sourceRow),
    ligand: frame.ligands.map(ligandRow),
  };
}

/** Gives the rows of ions and policies that complexes share, each with the first complex that needs it. */
export function sharedRows(frame: CollectionFrame): (complex: Pick<ComplexFacts, 'ion' | 'overrides'>) => Tables {
  const ions = new Set<string>();
  const policies = new Set([frame.policyId]);
  return ({ ion, overrides }): Tables => {
    const fresh = new Map(overrides.map((policy) => [policyId(policy), policy]));
    for (const id of fresh.keys()) if (policies.has(id)) fresh.delete(id);
    for (const id of fresh.keys()) policies.add(id);
    const policy = [...fresh].map(([id, one]) => policyRow(id, one, false));
    if (ions.has(ion.name)) return { policy };
    ions.add(ion.name);
    return { policy, ion: [ionRow(ion)], free_ion: freeIonSetNames.flatMap((set) => freeIonRows(set, ion)) };
  };
}

function metaRows(group: Group, engineHash: string, software: string): Row[] {
  const facts: Record<string, string | null> = {
    schema: '1',
    software,
    engine: engineHash,
    'group.title': group.title,
    'group.name': group.name,
    'group.description': group.description,
    'group.contact': group.contact,
    'group.licence': group.licence,
    'group.url': group.url,
    'group.release': group.release,
    'group.started': group.started,
    'group.doi': group.doi,
    'group.demonstration': String(group.demonstration),
  };
  return Object.entries(facts).flatMap(([key, value]) => (value === null ? [] : [{ key, value }]));
}

function policyRow(id: string, policy: Policy, inForce: boolean): Row {
  const perIon = Object.entries(policy.cOverB.perIon).sort(([a], [b]) => (a < b ? -1 : 1));
  return {
    id,
    name: policy.name,
    in_force: flag(inForce),
    C_over_B: policy.cOverB.general.value,
    C_over_B_u: policy.cOverB.general.u,
    C_over_B_per_ion: JSON.stringify(Object.fromEntries(perIon.map(([ion, { value, u }]) => [ion, { value, u }]))),
    C_fitted: flag(policy.cFitted),
    floor_general: policy.floors.general,
    floor_spin_flip: policy.floors.spinFlip,
    floor_two_electron: policy.floors.twoElectron,
    ceiling_Delta: policy.ceilings.delta,
    ceiling_B: policy.ceilings.racahB,
    ceiling_C: policy.ceilings.racahC,
    differential_Delta: policy.differentialFloor.delta,
    differential_B: policy.differentialFloor.racahB,
    free_ion_set: policy.freeIons,
    rival_margin: policy.rivalMargin,
    default_u_maximum: policy.defaultUncertainties.maximum,
    default_u_line: policy.defaultUncertainties.line,
  };
}

function ionRow(ion: Ion): Row {
  return { name: ion.name, metal: ion.metal, oxidation: ion.oxidation, electrons: ion.electrons, shell: ion.row };
}

/** The free ion of a set, where the set has it. */
export function freeIonRows(set: FreeIonSetName, ion: Ion): Row[] {
  const values = freeIon(set, ion);
  if (values === null) return [];
  return [{ set_name: set, ion: ion.name, B0: values.racahB0, C0: values.racahC0, kind: values.kind, source: values.source }];
}

function sourceRow(source: SourceRecord): Row {
  return {
    id: source.id, file: source.file, reference: source.reference, authors: list(source.authors), title: source.title,
    journal: source.journal, year: source.year, volume: source.volume, pages: source.pages, doi: source.doi, url: source.url,
  };
}

function ligandRow(ligand: LigandRecord): Row {
  return {
    id: ligand.id, file: ligand.file, name: ligand.name, formula: ligand.formula, abbreviation: ligand.abbreviation,
    synonyms: list(ligand.synonyms), charge: ligand.charge, denticity: ligand.denticity, donors: list(ligand.donors),
    smiles: ligand.smiles, notes: ligand.notes,
  };
}

/** What the collection would be released as. */
export function releaseRow({ group, policyId: policy }: CollectionFrame, complexes: readonly ComplexFacts[]): Row {
  return {
    id: group.release, doi: group.doi, licence: group.licence, policy,
    complexes: complexes.length,
    measurements: complexes.reduce((count, { verdicts }) => count + verdicts.length, 0),
  };
}

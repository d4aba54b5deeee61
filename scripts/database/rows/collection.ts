import { freeIon, policyId } from '#engine';
import type { FreeIonSetName, Ion, Policy } from '#engine';
import type { Collection, Group, LigandRecord, SourceRecord } from '../../content/types.ts';
import { flag, list } from './row.ts';
import type { Row, Tables } from './row.ts';

const freeIonSetNames: readonly FreeIonSetName[] = ['published', 'atomic-levels'];

/** Rows of everything that belongs to the collection as a whole: meta, people, policies, ions, sources, ligands, release. */
export function collectionRows(collection: Collection, engineHash: string, software: string): Tables {
  const ions = ionsOf(collection);
  return {
    meta: metaRows(collection.group, engineHash, software),
    person: collection.group.people.map((person, index) => ({
      number: index + 1, name: person.name, orcid: person.orcid, initials: person.initials,
    })),
    policy: policyRows(collection),
    ion: ions.map(ionRow),
    free_ion: freeIonSetNames.flatMap((set) => ions.flatMap((ion) => freeIonRows(set, ion))),
    source: collection.sources.map(sourceRow),
    ligand: collection.ligands.map(ligandRow),
    release: [releaseRow(collection)],
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

function policyRows(collection: Collection): Row[] {
  const policies = new Map<string, Policy>([[collection.policyId, collection.policy]]);
  for (const complex of collection.complexes) {
    for (const measurement of complex.measurements) policies.set(policyId(measurement.policy), measurement.policy);
  }
  return [...policies].map(([id, policy]) => policyRow(id, policy, id === collection.policyId));
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

function ionsOf(collection: Collection): readonly Ion[] {
  const ions = new Map(collection.complexes.map((complex) => [complex.ion.name, complex.ion]));
  return [...ions.values()];
}

function ionRow(ion: Ion): Row {
  return { name: ion.name, metal: ion.metal, oxidation: ion.oxidation, electrons: ion.electrons, shell: ion.row };
}

function freeIonRows(set: FreeIonSetName, ion: Ion): Row[] {
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

function releaseRow({ group, policyId: policy, complexes }: Collection): Row {
  return {
    id: group.release, doi: group.doi, licence: group.licence, policy,
    complexes: complexes.length,
    measurements: complexes.reduce((count, complex) => count + complex.measurements.length, 0),
  };
}

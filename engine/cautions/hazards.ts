import type { Ion } from '../ions/types.ts';
import type { Caution } from './types.ts';
import { formulaGroups, formulaGroupsInProse, formulaWords } from './formulaGroups.ts';
import type { FormulaGroup } from './formulaGroups.ts';
import { hazardClasses } from './hazardClasses.ts';
import type { HazardClass } from './hazardClasses.ts';

/** All of a record that may name something dangerous. */
export interface HazardSubject {
  readonly ion: Ion;
  readonly formula: string;
  readonly name: string | null;
  readonly ligands: readonly {
    readonly id: string;
    readonly name: string;
    readonly formula: string;
    readonly abbreviation: string | null;
    readonly synonyms: readonly string[];
  }[];
  readonly measurements: readonly {
    readonly id: string;
    readonly sample: string | null;
    readonly medium: string | null;
    readonly host: string | null;
  }[];
  /** Codes that the group declared not to apply, each with a reason kept elsewhere. */
  readonly overridden: readonly string[];
}

export interface HazardCaution extends Caution {
  /** What raised it, in words: "the sample of aq-295". */
  readonly foundIn: string;
}

/** The codes that hazard cautions may carry. */
export const hazardCodes: readonly string[] = hazardClasses.map(({ code }) => code);

/** The sentence at the foot of every record. */
export const hazardFooter = 'No caution here does not mean no hazard.';

const advice =
  'This page is a data record, not a preparation. Before handling, consult the safety data sheet and your local rules, ' +
  'and make your own risk assessment with a qualified person.';

interface Place {
  readonly where: string;
  readonly text: string;
  /** A formula is read whole; a ligand's formula is one too; names and media are free text. */
  readonly kind: 'formula' | 'ligand formula' | 'text' | 'medium';
}

/** A place with what its text holds, read once for all classes. */
interface ReadPlace extends Pick<Place, 'where' | 'kind'> {
  readonly plain: string;
  readonly groups: readonly FormulaGroup[];
  /** Groups that may be ligands. */
  readonly bound: readonly FormulaGroup[];
}

/**
 * Hazard cautions of a complex, in the order of the table, at most one of each code. Triggers are looked for in the formula, the
 * metal ion, the ligands, and the samples, media and hosts of the measurements. A caution that is not raised says nothing:
 * the table knows common classes only. Source: common practice, from memory.
 */
export function hazardCautions(subject: HazardSubject): readonly HazardCaution[] {
  const places = placesOf(subject).map(readPlace);
  return hazardClasses.flatMap((hazard) => {
    if (subject.overridden.includes(hazard.code)) return [];
    const found = places.filter((place) => isRaised(hazard, place)).map(({ where }) => where);
    if (hazard.ion?.(subject.ion) === true) found.unshift(`the metal ion ${subject.ion.name}`);
    if (found.length === 0) return [];
    return [{ code: hazard.code, text: `Caution: ${hazard.text} ${advice}`, foundIn: [...new Set(found)].join('; ') }];
  });
}

function placesOf({ formula, name, ligands, measurements }: HazardSubject): readonly Place[] {
  const places: (Omit<Place, 'text'> & { readonly text: string | null })[] = [
    { where: 'the formula', text: formula, kind: 'formula' },
    { where: 'the name', text: name, kind: 'text' },
  ];
  for (const ligand of ligands) {
    const where = `the ligand ${ligand.id}`;
    places.push({ where, text: ligand.formula, kind: 'ligand formula' });
    for (const text of [ligand.name, ligand.abbreviation, ...ligand.synonyms]) places.push({ where, text, kind: 'text' });
  }
  for (const { id, sample, medium, host } of measurements) {
    places.push(
      { where: `the sample of ${id}`, text: sample, kind: 'text' },
      { where: `the medium of ${id}`, text: medium, kind: 'medium' },
      { where: `the host of ${id}`, text: host, kind: 'text' },
    );
  }
  return places.filter((place): place is Place => place.text !== null);
}

function readPlace({ where, kind, text }: Place): ReadPlace {
  const groups = groupsOf(text, kind);
  return { where, kind, plain: text.normalize('NFKC'), groups, bound: kind === 'ligand formula' ? groups : bracketed(text) };
}

function isRaised(hazard: HazardClass, { plain, kind, groups, bound }: ReadPlace): boolean {
  if (hazard.words?.test(plain) === true) return true;
  if (kind === 'medium' && hazard.mediumWords?.test(plain) === true) return true;
  if (hazard.group !== undefined && groups.some(hazard.group)) return true;
  return hazard.ligandGroup !== undefined && bound.some(hazard.ligandGroup);
}

function groupsOf(text: string, kind: Place['kind']) {
  if (kind === 'text' || kind === 'medium') return formulaGroupsInProse(text);
  return formulaWords(text).flatMap((word) => formulaGroups(word) ?? []);
}

// Groups in brackets alone: what is left of a formula's groups without the last one, which stands outside all brackets.
function bracketed(text: string) {
  return formulaWords(text).flatMap((word) => formulaGroups(word)?.slice(0, -1) ?? []);
}

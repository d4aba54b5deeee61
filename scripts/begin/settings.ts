// group.yaml and policy.yaml of a collection that begins.

import { concise, defaultPolicy, slug, typedText } from '#engine';

export interface NewGroup {
  readonly group: string;
  readonly title: string;
  /** SPDX identifier. */
  readonly licence: string;
  /** Address of the site with its base path. */
  readonly url: string;
  /** ISO date. */
  readonly started: string;
  readonly contact: string | null;
  readonly person: string | null;
}

/** Address that stands for "not known yet": a domain reserved for examples. */
export const placeholderUrl = 'https://example.org/bands/';

/** Day that stands for "not typed yet": no clock is asked, and a release is refused while it stands. */
export const placeholderStart = '1900-01-01';

/** The text of group.yaml. */
export function groupText({ group, title, licence, url, started, contact, person }: NewGroup): string {
  const initials = person === null ? null : initialsOf(person);
  return [
    '# Whose collection this is and how it is published. content/README.md lists every field.',
    `title: ${typedText(title)}`,
    `group: ${typedText(group)}`,
    // The first page says it as long as the example stands.
    'description: "This collection has just begun. Its first record is an example with invented readings."    # change it with your first record',
    contact === null ? '# contact: bands@example.org             # where a reader reports a mistake' : `contact: ${typedText(contact)}`,
    ...(person === null
      ? ['# people:', '#   - { name: Your Name, initials: YN }  # the initials stand in by: of a measurement; orcid: where there is one']
      : ['people:', `  - { name: ${typedText(person)}${initials === null ? '' : `, initials: ${typedText(initials)}`} }`]),
    `licence: ${typedText(licence)}                       # SPDX identifier of the licence of your records`,
    `url: ${url}          # where the site will stand, with its base path${url === placeholderUrl ? ': change it before you publish' : ''}`,
    'release: 0.1.0',
    `started: ${started}                      # day on which the collection was started${started === placeholderStart ? ': type yours, everything is dated by it until the first release' : ''}`,
    '',
  ].join('\n');
}

/** The text of policy.yaml: the defaults, typed out so that a reader sees them. */
export function policyText(started: string): string {
  const { cOverB, floors, ceilings, differentialFloor, freeIons, rivalMargin, defaultUncertainties } = defaultPolicy;
  const share = (value: number): string => `${Number((value * 100).toPrecision(6))} %`;
  return [
    '# The fitting choices of the group: one policy for every result. These are the defaults; a change refits the whole collection.',
    `name: ${started === placeholderStart ? 'house' : slug(`house-${started.slice(0, 4)}`, 'house')}`,
    `C/B: ${concise(cOverB.general.value, cOverB.general.u)}`,
    `floors: { general: ${floors.general} cm-1, spin-flip: ${floors.spinFlip} cm-1, two-electron: ${floors.twoElectron} cm-1 }`,
    `ceilings: { Delta: ${share(ceilings.delta)}, B: ${share(ceilings.racahB)}, C: ${share(ceilings.racahC)} }`,
    `differential-floor: { Delta: ${differentialFloor.delta} cm-1, B: ${share(differentialFloor.racahB)} }`,
    `free-ions: ${freeIons}`,
    `rival-margin: ${rivalMargin}`,
    `default-uncertainties: { maximum: ${defaultUncertainties.maximum} cm-1, line: ${defaultUncertainties.line} cm-1 }`,
    '',
  ].join('\n');
}

/** "TL" for "Tove Lind"; null where the name holds no letters. */
function initialsOf(name: string): string | null {
  const letters = name.split(/[\s-]+/).flatMap((word) => /\p{L}/u.exec(word)?.[0] ?? []).join('').toUpperCase();
  return letters === '' ? null : letters;
}

// Bands and absent ranges of one measurement: fields that go together, widths, overlaps.

import { couldBeSeen, toWavenumber, widthToWavenumber } from '#engine';
import type { Range } from '#engine';
import { typedText } from '../report.ts';
import type { Reporter } from '../report.ts';
import { highestBand, lowestBand } from '../schema/physical.ts';
import type { TypedRanges } from '../schema/leaves.ts';
import { bandRoles } from '../records/measurement.ts';
import type { MeasurementDraft } from './complex.ts';

/**
 * Below this, cm-1, lie vibrations and their overtones, and no maximum of a d-d or charge-transfer band: the smallest splittings of
 * tetrahedral iodides are near 2600 (common practice, no source). Wavelengths of the near infrared have numbers up to here.
 */
const lowestElectronic = 2500;

export function checkBands({ bands, scanned }: MeasurementDraft, path: readonly (string | number)[], report: Reporter): void {
  const looked = rangesScanned(scanned);
  const absent: { readonly low: number; readonly high: number; readonly typed: string; readonly index: number }[] = [];
  bands?.forEach((band, index) => {
    if (band === undefined || !('absent' in band) || band.absent === undefined) return;
    for (const { low, high } of band.absent.ranges) absent.push({ low, high, typed: band.absent.typed, index });
    if (band.absent.ranges.some(({ low, high }) => low < lowestBand || high > highestBand)) {
      report.at([...path, 'bands', index, 'absent'], { code: 'BAND_RANGE', found: typedText(band.absent.typed), expected: 'a range from 1000 to 100 000 cm-1 (100 to 10 000 nm)', mend: 'check the unit: numbers of three digits are often nm' });
    }
  });
  bands?.forEach((band, index) => {
    if (band === undefined || !('position' in band)) return;
    const at = (field: string) => [...path, 'bands', index, field];
    if (band.side !== undefined && band.kind !== 'shoulder') {
      report.at(at('side'), { code: 'FIELD_NOT_HERE', found: `side without kind: shoulder`, expected: 'side with a shoulder only', mend: 'write kind: shoulder, or delete side' });
    }
    if (band.degeneracy !== undefined && band.kind !== 'component') {
      report.at(at('degeneracy'), { code: 'FIELD_NOT_HERE', found: 'degeneracy without kind: component', expected: 'degeneracy with a component only', mend: 'write kind: component, or delete degeneracy' });
    }
    if (band.position === undefined) return;
    const { position } = toWavenumber(band.position);
    const width = band.width === undefined ? null : widthToWavenumber(position, band.width);
    if (band.width !== undefined && (width === null || width >= position)) {
      report.at(at('width'), { code: 'BAND_WIDTH', found: typedText(band.width.typed), expected: `a width smaller than the position, ${band.position.typed}`, mend: 'check the number and its unit' });
    }
    const asWavelength = wavelengthTypedAsWavenumber(band.position.typed, position, band.term);
    if (asWavelength !== null && !wasScanned(position, looked) && !wasScanned(1e7 / position, looked)) {
      report.at(at('position'), {
        code: 'BAND_UNIT', found: typedText(band.position.typed), expected: `a position above ${lowestElectronic} cm-1, below which only vibrations lie`,
        mend: `if it is a wavelength write ${asWavelength}; if it is a vibration add term: vibration; if it is a band, type scanned with its range`,
      });
    } else if (looked.length > 0 && !couldBeSeen(position, width, rangesOf(looked))) {
      const place = { found: `${typedText(band.position.typed)}, scanned ${looked.map(({ typed }) => typed).join('; ')}`, expected: 'a position inside what was scanned' };
      if (/cm|nm/.test(band.position.typed) && wasScanned(1e7 / position, looked)) {
        report.at(at('position'), { ...place, code: 'BAND_UNIT', mend: 'check the unit: the same number in the other one, nm or cm-1, lies inside' });
      } else if (isFitted(band)) {
        report.at(at('position'), { ...place, code: 'BAND_NOT_SCANNED', mend: 'correct the position, type in scanned all that was looked at, or say with left-out why the band is only noted' });
      }
    }
    const inside = absent.find(({ low, high }) => position > low && position < high);
    if (inside !== undefined) {
      report.at([...path, 'bands', inside.index, 'absent'], {
        code: 'ABSENT_OVERLAP', found: `${typedText(inside.typed)}, with the band at ${band.position.typed} inside`, expected: 'a range without any band of this measurement',
        mend: 'shorten the range, or type it as two ranges around the band',
      });
    }
  });
}

/** Not a charge-transfer band and the like, and not left out: such may be noted from elsewhere, and nothing hangs on them. */
function isFitted({ term, 'left-out': leftOut }: { readonly term?: unknown; readonly 'left-out'?: unknown }): boolean {
  return leftOut === undefined && !(typeof term === 'string' && bandRoles.includes(term));
}

/** The typed wavenumber as a wavelength, where no electronic band can lie so low; null where one can, or the unit is another. */
function wavelengthTypedAsWavenumber(typed: string, position: number, term: string | readonly (string | undefined)[] | undefined): string | null {
  const known = [term].flat().some((one) => one === 'vibration' || one === 'impurity');
  if (known || position >= lowestElectronic || !/cm/.test(typed)) return null;
  return `${typed.replace(/\s*\/?\s*(1\s*\/\s*)?cm.*$/u, '').trim()} nm`;
}

/** All that was scanned; none where a part of it cannot be read. */
function rangesScanned(scanned: MeasurementDraft['scanned']): readonly TypedRanges[] {
  const all = scanned === undefined ? [] : 'ranges' in scanned ? [scanned] : scanned;
  return all.some((one) => one === undefined) ? [] : all.filter((one) => one !== undefined);
}

const rangesOf = (looked: readonly TypedRanges[]): readonly Range[] => looked.flatMap(({ ranges }) => ranges);

const wasScanned = (position: number, looked: readonly TypedRanges[]): boolean => couldBeSeen(position, null, rangesOf(looked));

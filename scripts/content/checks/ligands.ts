// The ligands of a complex: each has a record, and their donor atoms add up.

import { donorCount } from '#engine';
import { nearNames, orList } from '../nearest.ts';
import { typedText } from '../report.ts';
import type { Reporter } from '../report.ts';
import type { LigandRecord } from '../types.ts';
import { geometries } from '../vocabulary.ts';
import type { ComplexDraft, KnownRecords } from './complex.ts';

export interface CountedLigand {
  readonly record: LigandRecord;
  readonly count: number;
  readonly bound: number;
}

/** Reports unknown ligands and donor sums. Returns the ligands, or null where any could not be read. */
export function checkLigands({ ligands, geometry, nuclearity, ion }: ComplexDraft, report: Reporter, known: KnownRecords): readonly CountedLigand[] | null {
  if (ligands === undefined) return null;
  const counted: CountedLigand[] = [];
  let complete = true;
  for (const [id, typed] of Object.entries(ligands)) {
    if (!known.ligandIds.has(id)) {
      const near = nearNames(id, known.ligandIds);
      report.at(['ligands', id], { code: 'UNKNOWN_LIGAND', found: typedText(id), expected: 'the id of a record in ligands/', mend: near.length > 0 ? `write ${orList(near)}` : `make the file ligands/${id}.yaml` });
      complete = false;
      continue;
    }
    const record = known.ligands.get(id);
    const count = typeof typed === 'number' ? typed : typed?.count;
    if (record === undefined || count === undefined) {
      complete = false;
      continue;
    }
    const bound = (typeof typed === 'number' ? undefined : typed?.bound) ?? record.denticity;
    if (bound > record.denticity) {
      report.at(['ligands', id, 'bound'], { code: 'BOUND_COUNT', found: typedText(String(bound)), expected: `at most ${record.denticity}: one ${id} has ${record.denticity} donor atom${record.denticity === 1 ? '' : 's'}`, mend: 'count the donor atoms that each one binds, not those of all together' });
      complete = false;
      continue;
    }
    counted.push({ record, count, bound });
  }
  if (!complete) return null;
  const wanted = geometry === undefined ? null : geometries[geometry];
  const found = donorCount(counted);
  // Bridging ligands count for more than one metal: nothing can be said there.
  if (wanted !== null && (nuclearity ?? 1) === 1 && found !== wanted) {
    const sum = counted.map(({ record, count, bound }) => `${count} ${record.id} x ${bound}`).join(' + ');
    report.at(['ligands'], {
      code: 'DONOR_COUNT', found: `${sum} = ${found} donor atoms`, expected: `${wanted} donor atoms around ${ion?.name ?? 'the metal'} (${geometry})`,
      mend: 'correct how many there are, add the missing ligand, or say how many donors each binds: { count: 2, bound: 1 }',
    });
  }
  return counted;
}

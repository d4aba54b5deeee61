// The kinds of file that a content folder holds, each with its schema: what the manual and the editors' schema describe.

import type { z } from 'zod';
import { complexSchema } from './complex.ts';
import { goneSchema } from './gone.ts';
import { groupSchema } from './group.ts';
import { ligandSchema } from './ligand.ts';
import { policySchema } from './policy.ts';
import { sourceSchema } from './source.ts';

export interface RecordKind {
  readonly name: string;
  readonly files: string;
  readonly schema: z.ZodObject;
}

export const recordKinds: readonly RecordKind[] = [
  { name: 'complex', files: 'complexes/ID.yaml', schema: complexSchema },
  { name: 'ligand', files: 'ligands/ID.yaml', schema: ligandSchema },
  { name: 'source', files: 'sources/ID.yaml', schema: sourceSchema },
  { name: 'group', files: 'group.yaml', schema: groupSchema },
  { name: 'policy', files: 'policy.yaml', schema: policySchema },
  { name: 'gone', files: 'releases/gone.yaml', schema: goneSchema },
];

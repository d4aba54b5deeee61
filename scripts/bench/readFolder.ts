// Reads every measurement of a content folder once; the process that the bench profiles.

import { readCollection } from '../content/readCollection.ts';
import { measurementsOf, readOne } from './records.ts';

const { collection } = readCollection(process.argv[2]!);
if (collection === null) throw new Error('the content has faults');
measurementsOf(collection).forEach(readOne);

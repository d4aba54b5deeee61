// Reads every measurement of a content folder once; the process that the bench profiles.

import { readCollection } from '../content/readCollection.ts';
import { readOneAsJson } from '../database/readOne.ts';
import { tasksOf } from './records.ts';

const { collection } = readCollection(process.argv[2]!);
if (collection === null) throw new Error('the content has faults');
tasksOf(collection).forEach(readOneAsJson);

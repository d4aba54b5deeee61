import { mainFiles, recordFiles } from '../../scripts/export/files.ts';
import { type RecordNumber, dataCatalog, dataset, jsonLdText, recordDataset } from '../../scripts/export/metadata/jsonLd.ts';
import { licenceAddress } from '../../scripts/export/metadata/publication.ts';
import { type TypedLink, recordLinks, setLinks } from '../../scripts/export/metadata/signposting.ts';
import { complexName } from './complexName.ts';
import { citedRecord, publication } from './publication.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';

/** What the head of a page says to machines. */
export interface HeadData {
  /** Signposting links. */
  readonly links: readonly TypedLink[];
  /** Text of a JSON-LD script; no "<" is left in it. */
  readonly jsonLd: string;
}

/** Head of the front page: the collection as a DataCatalog. */
export function collectionHead(tree: CollectionTree): HeadData {
  const about = publication(tree);
  return { links: [{ rel: 'license', href: licenceAddress(about.licence) }], jsonLd: jsonLdText(dataCatalog(about)) };
}

/** Head of the data page, the landing page of the set: a Dataset. */
export function dataHead(tree: CollectionTree): HeadData {
  const about = publication(tree);
  return { links: setLinks(about), jsonLd: jsonLdText(dataset(about, mainFiles)) };
}

/** Head of a complex's page: a Dataset about a MolecularEntity and the ChemicalSubstances that were weighed. */
export function complexHead(tree: CollectionTree, complex: ComplexNode): HeadData {
  const [about, record] = [publication(tree), citedRecord(complex)];
  return {
    links: recordLinks(about, record),
    jsonLd: jsonLdText(recordDataset(about, {
      ...record, names: [complexName(complex)], samples: complex.measurements.flatMap(({ row }) => row.sample ?? []), numbers: complex.measurements.flatMap(numbers), files: recordFiles,
    })),
  };
}

function numbers({ row, chosen }: MeasurementNode): RecordNumber[] {
  return (['Delta', 'B', 'C', 'beta'] as const).map((name) => {
    const { value, u_total, standing, reason } = chosen.parameters[name];
    return { measurement: row.id, name, value, uTotal: u_total, unit: name === 'beta' ? '1' : 'cm-1', standing, reason };
  });
}

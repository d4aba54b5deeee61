// The fields of a complex record in the order in which they are written. A test holds these lists against the record format.

export const complexFields = [
  'formula', 'name', 'ion', 'geometry', 'isomer', 'ligands', 'spin', 'nuclearity', 'innocence', 'charge-note', 'hazards', 'notes', 'measurements',
] as const;

export const measurementFields = [
  'id', 'sample', 'phase', 'medium', 'host', 'temperature', 'technique', 'scanned', 'concentration', 'path-length', 'batch', 'raw',
  'magnetic-moment', 'epr-g', 'source', 'policy', 'notes', 'bands', 'quoted',
] as const;

export const bandFields = [
  'position', 'absent', 'kind', 'side', 'degeneracy', 'deconvoluted', 'epsilon', 'strength', 'width', 'term', 'left-out', 'notes',
] as const;

export const quotedFields = ['Delta', 'Dq', 'B', 'C', 'beta', 'cite', 'where'] as const;

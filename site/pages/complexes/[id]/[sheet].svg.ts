import type { APIRoute, GetStaticPaths } from 'astro';
import { loadCollection } from '../../../data/database.ts';
import { keptFigure } from '../../../data/figureFile.ts';
import { SHEETS, hasSheet, ownSheet } from '../../../data/ownFigures.ts';

export const getStaticPaths: GetStaticPaths = () =>
  loadCollection().complexes.flatMap((complex) => SHEETS.filter((sheet) => hasSheet(loadCollection(), complex, sheet)).map((sheet) => ({ params: { id: complex.row.id, sheet }, props: { complex, sheet } })));

export const GET: APIRoute = ({ props }) => new Response(keptFigure(ownSheet(loadCollection(), props['complex'], props['sheet'])), { headers: { 'content-type': 'image/svg+xml' } });

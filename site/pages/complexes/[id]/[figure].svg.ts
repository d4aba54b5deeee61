import type { APIRoute, GetStaticPaths } from 'astro';
import { loadCollection } from '../../../data/database.ts';
import { keptFigure } from '../../../data/figureFile.ts';
import { ownFigure, ownFigureIds } from '../../../data/ownFigures.ts';

export const getStaticPaths: GetStaticPaths = () =>
  loadCollection().complexes.flatMap((complex) => ownFigureIds(loadCollection(), complex).map((figure) => ({ params: { id: complex.row.id, figure }, props: { complex } })));

export const GET: APIRoute = ({ params, props }) =>
  new Response(keptFigure(ownFigure(loadCollection(), props['complex'], params['figure']!).svg), { headers: { 'content-type': 'image/svg+xml' } });

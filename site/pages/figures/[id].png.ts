import type { APIRoute, GetStaticPaths } from 'astro';
import { loadCollection } from '../../data/database.ts';
import { keptFigure } from '../../data/figureFile.ts';
import { publishedFigures } from '../../data/figures.ts';
import { pngOf } from '../../data/png.ts';

export const getStaticPaths: GetStaticPaths = () => publishedFigures(loadCollection()).map(({ id, svg }) => ({ params: { id }, props: { svg } }));

export const GET: APIRoute = ({ props }) => new Response(Buffer.from(pngOf(keptFigure(props['svg']))), { headers: { 'content-type': 'image/png' } });

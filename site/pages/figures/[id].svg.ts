import type { APIRoute, GetStaticPaths } from 'astro';
import { loadCollection } from '../../data/database.ts';
import { keptFigure, picture } from '../../data/figureFile.ts';
import { pictures, publishedFigures } from '../../data/figures.ts';

export const getStaticPaths: GetStaticPaths = () => {
  const tree = loadCollection();
  return [
    ...publishedFigures(tree).map(({ id, svg }) => ({ params: { id }, props: { text: keptFigure(svg) } })),
    ...pictures(tree).map(({ id, svg }) => ({ params: { id }, props: { text: picture(svg) } })),
  ];
};

export const GET: APIRoute = ({ props }) => new Response(props['text'], { headers: { 'content-type': 'image/svg+xml' } });

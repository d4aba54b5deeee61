import type { APIRoute, GetStaticPaths } from 'astro';
import { loadCollection } from '../../data/database.ts';
import { backgrounds, publishedFigures, standalone } from '../../data/figures.ts';

export const getStaticPaths: GetStaticPaths = () => {
  const tree = loadCollection();
  return [
    ...publishedFigures(tree).map(({ id, svg }) => ({ params: { id }, props: { text: standalone(svg, true) } })),
    ...backgrounds(tree).map(({ id, svg }) => ({ params: { id }, props: { text: standalone(svg, false) } })),
  ];
};

export const GET: APIRoute = ({ props }) => new Response(props['text'], { headers: { 'content-type': 'image/svg+xml' } });

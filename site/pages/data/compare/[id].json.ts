import type { APIRoute, GetStaticPaths } from 'astro';
import { comparedComplex } from '../../../data/compare.ts';
import { complexOf } from '../../../data/complex.ts';
import { loadCollection } from '../../../data/database.ts';

export const getStaticPaths: GetStaticPaths = () => loadCollection().complexes.map((complex) => ({ params: { id: complex.row.id } }));

export const GET: APIRoute = ({ params }) => {
  const tree = loadCollection();
  const complex = complexOf(tree, params['id']!);
  return new Response(JSON.stringify(comparedComplex(tree, complex)), { headers: { 'content-type': 'application/json' } });
};

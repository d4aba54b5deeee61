import type { APIRoute, GetStaticPaths } from 'astro';
import { loadCollection } from '../../data/database.ts';
import { numberFiles } from '../../data/figures.ts';

export const getStaticPaths: GetStaticPaths = () => numberFiles(loadCollection()).map(({ id, csv }) => ({ params: { id }, props: { csv } }));

export const GET: APIRoute = ({ props }) => new Response(props['csv'], { headers: { 'content-type': 'text/csv; charset=utf-8' } });

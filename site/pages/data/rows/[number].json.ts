import type { APIRoute, GetStaticPaths } from 'astro';
import { loadCollection } from '../../../data/database.ts';
import { rowSlice, rowSlices } from '../../../data/rowSlices.ts';

export const getStaticPaths: GetStaticPaths = () => rowSlices(loadCollection()).map((number) => ({ params: { number: String(number) } }));

export const GET: APIRoute = ({ params }) => new Response(JSON.stringify(rowSlice(loadCollection(), Number(params['number']))), { headers: { 'content-type': 'application/json' } });

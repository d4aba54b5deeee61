import type { APIRoute } from 'astro';
import { comparedCollection } from '../../data/compare.ts';
import { loadCollection } from '../../data/database.ts';

export const GET: APIRoute = () => new Response(JSON.stringify(comparedCollection(loadCollection())), { headers: { 'content-type': 'application/json' } });

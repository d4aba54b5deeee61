import type { APIRoute } from 'astro';
import { loadCollection } from '../../data/database.ts';
import { searchData } from '../../data/search.ts';

export const GET: APIRoute = () => new Response(JSON.stringify(searchData(loadCollection())), { headers: { 'content-type': 'application/json' } });

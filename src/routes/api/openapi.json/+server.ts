import { json } from '@sveltejs/kit';
import { openApiDocument } from '$lib/server/api/openapi';
import { env } from '$lib/server/env';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals }) =>
	json(openApiDocument(env().origin, locals.gym!.name));

import { redirect } from '@sveltejs/kit';
import { themeForm } from '$lib/forms/theme';
import { readForm } from '$lib/forms/read-form';
import { returnPath } from '$lib/server/auth/return-path';
import { requireViewer } from '$lib/server/guard';
import { setTheme } from '$lib/server/people/set-theme';
import { safeForm } from '$lib/server/safe-body';
import type { RequestHandler } from './$types';

/** Posted from the account menu of any page, which it leads back to. */
export const POST: RequestHandler = async (event) => {
	const viewer = requireViewer(event);
	const read = readForm(themeForm, await safeForm(event));
	if (read.ok) await setTheme(viewer, read.data.theme);
	redirect(303, pageBefore(event.request, event.url.origin));
};

function pageBefore(request: Request, origin: string): string {
	const referer = request.headers.get('referer') ?? '';
	return referer.startsWith(`${origin}/`) ? returnPath(referer.slice(origin.length), '/') : '/';
}

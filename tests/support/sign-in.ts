import type { RunningServer } from './server';

/** A cookie jar and an Origin header: what a browser adds to a request by itself. */
export type Client = (
	path: string,
	init?: RequestInit & { origin?: string | null }
) => Promise<Response>;

/** A client that nobody signed in with. Redirects are answers, not followed. */
export function anonymous(server: Pick<RunningServer, 'url' | 'origin'>): Client {
	const jar = new Map<string, string>();
	return async (path, { origin = server.origin, ...init } = {}) => {
		const headers = new Headers(init.headers);
		if (jar.size > 0) headers.set('cookie', [...jar].map(([k, v]) => `${k}=${v}`).join('; '));
		const isUnsafe = !['GET', 'HEAD', undefined].includes(init.method);
		if (isUnsafe && origin !== null) headers.set('origin', origin);
		const answer = await fetch(server.url + path, { redirect: 'manual', ...init, headers });
		for (const set of answer.headers.getSetCookie()) keep(jar, set);
		return answer;
	};
}

function keep(jar: Map<string, string>, set: string): void {
	const [pair = '', ...attributes] = set.split(';');
	const [name = '', value = ''] = pair.split(/=(.*)/s);
	const isGone = attributes.some((a) => /^\s*max-age=0$/i.test(a)) || value === '';
	if (isGone) jar.delete(name);
	else jar.set(name, value);
}

/** Signs in as the API's own clients do: by password, at the address of Auth.js. */
export async function signedIn(
	server: Pick<RunningServer, 'url' | 'origin'>,
	email: string,
	password: string
): Promise<Client> {
	const client = anonymous(server);
	const csrf = (await (await client('/auth/csrf')).json()) as { csrfToken: string };
	const answer = await client('/auth/callback/credentials', {
		method: 'POST',
		headers: { 'content-type': 'application/x-www-form-urlencoded' },
		body: new URLSearchParams({ email, password, csrfToken: csrf.csrfToken })
	});
	const session = (await (await client('/auth/session')).json()) as { user?: object } | null;
	if (!session?.user) throw new Error(`${email} was not signed in: ${answer.status}`);
	return client;
}

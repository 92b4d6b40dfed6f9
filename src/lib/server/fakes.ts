import { demoAccounts, demoPassword } from '$lib/fakes/demo-accounts';
import { env } from './env';

/** What the sign-in page of the demo says; null in a gym of somebody's own. */
export function demoSignIns(): { emails: string[]; password: string } | null {
	const { mode } = env();
	return mode === 'demo' || mode === 'development'
		? { emails: demoAccounts, password: demoPassword }
		: null;
}

/** Where mail arrives while the fake stands in; null where a real mail server is named. */
export function inboxAddress(): string | null {
	const { mailUrl, mode, origin, port } = env();
	if (mailUrl !== null || mode === 'production') return null;
	const inbox = new URL(origin);
	inbox.port = String(port + 1);
	return inbox.origin;
}

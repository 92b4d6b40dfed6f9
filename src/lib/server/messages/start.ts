import type { Env } from '../env';
import { startOutbox } from './worker';

/** Starts what sends mail, and the local stand-in where no mail server is named. */
export async function startMail(settings: Env): Promise<() => Promise<void>> {
	const fake = settings.mailUrl === null ? await startFake(settings.port) : null;
	const url = settings.mailUrl ?? fake?.url ?? '';
	const stopOutbox = startOutbox({ url, from: settings.mailFrom });
	return async () => {
		await stopOutbox();
		await fake?.stop();
	};
}

/** The inbox page is on the port above the app's, the mail server on the next. */
async function startFake(port: number) {
	const { startMailFake } = await import('$lib/fakes/mail/start');
	return startMailFake({ pagePort: port + 1, smtpPort: port + 2 });
}

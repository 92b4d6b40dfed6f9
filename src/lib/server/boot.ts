import { prepareDecoy } from './auth/password';
import { now } from './clock';
import { closeDatabase, openDatabase } from './db';
import { migrateDatabase } from './db/migrate';
import { env, type Env } from './env';
import { announceFirstRun } from './gym/first-run-code';
import { currentGym, type Gym } from './gym/queries';
import { setHeadersOnEveryAnswer } from './headers';
import { markReady } from './health';
import { startJobs } from './jobs';
import { log } from './log';
import { startMail } from './messages/start';

/** In development an edit loads this module anew: what the one before started stops first. */
const held = globalThis as typeof globalThis & { stopKithour?: () => Promise<void> };

/** Brings the process up, in this order; any step that fails stops it with one clear line. */
export async function boot(): Promise<void> {
	await held.stopKithour?.();
	const settings = env();
	const stopHeaders = setHeadersOnEveryAnswer(settings.origin);
	await step('DATABASE_URL cannot be used', async () => {
		await openDatabase(settings.databaseUrl, settings.databaseAuthToken);
		await migrateDatabase();
	});
	refuseDemoInProduction(settings, await currentGym());
	if (settings.mode === 'demo' || settings.mode === 'development') await seedWhenEmpty();
	if (!(await currentGym())) announceFirstRun();
	await prepareDecoy();
	const stopMail = await step('mail cannot be started', () => startMail(settings));
	const stopJobs = startJobs();
	held.stopKithour = () => shutDown([stopJobs, stopMail, stopHeaders]);
	process.once('sveltekit:shutdown', () => void held.stopKithour?.());
	markReady();
	log.info({ mode: settings.mode, origin: settings.origin }, 'ready');
}

async function step<T>(failing: string, work: () => Promise<T>): Promise<T> {
	try {
		return await work();
	} catch (error) {
		const reason = error instanceof Error ? error.message.split('\n')[0] : String(error);
		process.stderr.write(`kithour: ${failing}: ${reason}\n`);
		process.exit(1);
	}
}

/** The demo's passwords are printed in its README: such a database never meets the public. */
function refuseDemoInProduction(settings: Env, gym: Gym | null): void {
	if (settings.mode !== 'production' || !gym?.isDemo) return;
	process.stderr.write(
		'kithour: DATABASE_URL points at a database that the demo made; production refuses it\n'
	);
	process.exit(1);
}

async function seedWhenEmpty(): Promise<void> {
	if (await currentGym()) return;
	const { seedDemo } = await import('./db/seed');
	await seedDemo({ now: now() });
}

async function shutDown(stops: (() => Promise<void> | void)[]): Promise<void> {
	for (const stop of stops) await stop();
	await closeDatabase();
}

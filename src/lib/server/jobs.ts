import { now } from './clock';
import { log } from './log';
import { extendHorizon } from './slots/extend-horizon';

const hourMs = 3_600_000;

/**
 * What the gym does by itself, once at the start and then each hour: making the slots of every
 * series 26 weeks ahead. Doing it again changes nothing. Returns what stops it.
 */
export function startJobs(): () => Promise<void> {
	let round = run();
	const timer = setInterval(() => (round = run()), hourMs);
	timer.unref();
	return async () => {
		clearInterval(timer);
		await round;
	};
}

async function run(): Promise<void> {
	try {
		const { made } = await extendHorizon({ now: now() });
		if (made > 0) log.info({ made }, 'horizon extended');
	} catch (error) {
		log.error({ err: error }, 'horizon not extended');
	}
}

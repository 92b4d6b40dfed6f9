import { benchBooking } from './booking';
import { benchCalendar } from './calendar';
import { benchFeed } from './feed';
import { benchKit } from './kit';
import { benchScript } from './script';

export type Figure = { name: string; value: number; unit: string; target?: string };

/** `npm run bench`: every figure of the product in one run, beside what it is to reach. */
for (const bench of [benchKit, benchCalendar, benchBooking, benchFeed, benchScript]) {
	for (const { name, value, unit, target } of await bench()) {
		const figure = value >= 100 ? value.toFixed(0) : value.toPrecision(3);
		console.log(
			`${name.padEnd(64)} ${figure.padStart(8)} ${unit}${target ? `   to reach: ${target}` : ''}`
		);
	}
}
process.exit(0);

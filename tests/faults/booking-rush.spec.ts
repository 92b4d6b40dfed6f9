import { createClient } from '@libsql/client';
import { describe, expect, it } from 'vitest';
import { addDays } from '../../src/lib/domain/calendar/civil-date';
import { addMembers, addSlot, addSpecGym } from '../support/gym';
import { mintSignIns } from '../support/mint';
import { useServer } from '../support/use-server';

/** All twenty rounds of G1 by `FULL=1`; a short form otherwise. */
const rounds = process.env.FULL ? 20 : 1;
const people = 500;
const places = 12;
/** Connections at once, as the goal's recipe has it. */
const sockets = 64;
const today = new Date().toISOString().slice(0, 10);

type Answer = { status: number; booking?: { id: number; status: string; position?: number } };

/** What is wrong with the answers to a rush and with the rows it left; empty where nothing is. */
function faultsOf(answers: readonly Answer[], rows: Record<string, number>): string[] {
	const faults: string[] = [];
	const codes = answers.map(({ status }) => status).filter((status) => status !== 201);
	if (codes.length > 0) faults.push(`answered ${[...new Set(codes)].join(', ')}`);
	const booked = answers.filter(({ booking }) => booking?.status === 'booked');
	if (booked.length !== places) faults.push(`${booked.length} told that they are in`);
	const turns = answers
		.flatMap(({ booking }) => (booking?.status === 'waitlisted' ? [booking] : []))
		.sort((a, b) => a.id - b.id)
		.map(({ position }) => position);
	const inOrder = Array.from({ length: people - places }, (_, i) => i + 1);
	if (JSON.stringify(turns) !== JSON.stringify(inOrder)) faults.push('turns are not 1, 2, 3 …');
	const firstIn = Math.max(...booked.map(({ booking }) => booking!.id));
	const firstOut = Math.min(
		...answers.flatMap(({ booking }) => (booking?.status === 'waitlisted' ? [booking.id] : []))
	);
	if (firstIn > firstOut) faults.push('somebody who came later is in');
	if (rows.booked !== places || rows.waitlisted !== people - places) {
		faults.push(`rows say ${JSON.stringify(rows)}`);
	}
	return faults;
}

describe('a rush on twelve places over HTTP (goal G1)', () => {
	const slotIds: number[] = [];
	let cookies: string[] = [];
	const server = useServer(async () => {
		const gym = await addSpecGym({ barPlaces: 40 });
		cookies = await mintSignIns(await addMembers(people));
		for (let round = 0; round < rounds; round += 1) {
			const on = addDays(today, 2 + Math.floor(round / 2));
			const time = round % 2 ? '18:40' : '12:15';
			slotIds.push(await addSlot(gym, { on, time, setPlaces: places }));
		}
	});

	async function ask(slotId: number, cookie: string): Promise<Answer> {
		const answer = await fetch(`${server().url}/api/slots/${slotId}/bookings`, {
			method: 'POST',
			headers: { cookie, origin: server().origin, 'content-type': 'application/json' },
			body: '{}'
		});
		const body = (await answer.json()) as Pick<Answer, 'booking'>;
		return { status: answer.status, ...body };
	}

	async function rush(slotId: number): Promise<Answer[]> {
		const answers: Answer[] = [];
		const waiting = [...cookies];
		const socket = async () => {
			for (let cookie = waiting.pop(); cookie; cookie = waiting.pop()) {
				answers.push(await ask(slotId, cookie));
			}
		};
		await Promise.all(Array.from({ length: sockets }, socket));
		return answers;
	}

	async function rowsOf(slotId: number): Promise<Record<string, number>> {
		const client = createClient({ url: `file:${server().databaseFile}` });
		const { rows } = await client.execute({
			sql: 'select status, count(*) n from bookings where slot_id = ? group by status',
			args: [slotId]
		});
		client.close();
		return Object.fromEntries(rows.map(({ status, n }) => [String(status), Number(n)]));
	}

	it(`puts ${places} of ${people} in and the rest on the waitlist in order, ${rounds} times`, async () => {
		for (const slotId of slotIds) {
			expect(faultsOf(await rush(slotId), await rowsOf(slotId))).toEqual([]);
		}
	}, 600_000);

	it('would be found out: a place too many, a turn given twice, a fault', () => {
		const good: Answer[] = Array.from({ length: people }, (_, i) => ({
			status: 201,
			booking:
				i < places
					? { id: i, status: 'booked' }
					: { id: i, status: 'waitlisted', position: i - places + 1 }
		}));
		const rows = { booked: places, waitlisted: people - places };
		const broken = (i: number, answer: Answer) => faultsOf(good.with(i, answer), rows);
		expect(faultsOf(good, rows)).toEqual([]);
		expect(broken(places, { status: 201, booking: { id: places, status: 'booked' } })).not.toEqual(
			[]
		);
		expect(
			broken(20, { status: 201, booking: { id: 20, status: 'waitlisted', position: 1 } })
		).not.toEqual([]);
		expect(broken(30, { status: 500 })).not.toEqual([]);
		expect(faultsOf(good, { booked: places + 1, waitlisted: people - places })).not.toEqual([]);
	});
});

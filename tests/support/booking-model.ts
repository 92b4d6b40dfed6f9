/** What a booking can be told, by number, so that a run is the same for the model and the gym. */
export type Command =
	| { do: 'book'; member: number; slot: number }
	| { do: 'cancel'; booking: number }
	| { do: 'check-in'; booking: number }
	| { do: 'undo'; booking: number }
	| { do: 'wait'; minutes: number };

export type Answer = { ok: boolean; said: string };

type Booking = { member: number; slot: number; status: string };
type Slot = { startsAt: number; endsAt: number; places: number };

/** Ways in which a model can be wrong: each must be noticed. */
export type Mutation =
	'last-in-first' | 'no-refund' | 'a-place-too-many' | 'promotes-late' | 'free';

const minute = 60_000;
const cutOffMs = 120 * minute;
const rollOpensMs = 180 * minute;

/**
 * The rules of booking, once more and as plainly as can be: lists, counters and no database.
 * Packs of credits, a cut-off two hours before the start, promotion until then.
 */
export class BookingModel {
	readonly bookings: Booking[] = [];
	readonly credits: number[];

	constructor(
		readonly slots: readonly Slot[],
		members: number,
		credits: number,
		public now: number,
		readonly wrong?: Mutation
	) {
		this.credits = Array.from({ length: members }, () => credits);
	}

	run(command: Command): Answer {
		switch (command.do) {
			case 'wait':
				this.now += command.minutes * minute;
				return { ok: true, said: 'waited' };
			case 'book':
				return this.#book(command.member, command.slot);
			case 'cancel':
				return this.#cancel(command.booking);
			case 'check-in':
				return this.#mark(command.booking, 'attended');
			case 'undo':
				return this.#mark(command.booking, 'booked');
		}
	}

	#book(member: number, slot: number): Answer {
		if (this.now >= this.slots[slot]!.startsAt) return no('past');
		const live = ['booked', 'waitlisted', 'attended'];
		const already = this.bookings.some(
			(b) => b.member === member && b.slot === slot && live.includes(b.status)
		);
		if (already) return no('already-booked');
		if (this.credits[member]! < 1) return no('no-pass');
		const status = this.#isFull(slot) ? 'waitlisted' : 'booked';
		this.bookings.push({ member, slot, status });
		if (status === 'booked') this.#pay(member);
		return { ok: true, said: status };
	}

	#cancel(index: number): Answer {
		const booking = this.bookings[index];
		if (!booking) return no('not-found');
		if (!['booked', 'waitlisted'].includes(booking.status)) return no('not-live');
		const { startsAt } = this.slots[booking.slot]!;
		if (this.now >= startsAt) return no('past');
		const inTime = this.now <= startsAt - cutOffMs;
		const wasIn = booking.status === 'booked';
		booking.status = wasIn && !inTime ? 'late-cancelled' : 'cancelled';
		if (wasIn && inTime && this.wrong !== 'no-refund') this.credits[booking.member]! += 1;
		if (wasIn && (inTime || this.wrong === 'promotes-late')) this.#promote(booking.slot);
		return { ok: true, said: booking.status };
	}

	#mark(index: number, to: 'attended' | 'booked'): Answer {
		const booking = this.bookings[index];
		if (!booking) return no('not-found');
		if (this.now < this.slots[booking.slot]!.startsAt - rollOpensMs) return no('roll-not-open');
		if (!['booked', 'attended'].includes(booking.status)) return no('not-on-roll');
		booking.status = to;
		return { ok: true, said: to };
	}

	#promote(slot: number): void {
		const waiting = this.bookings.filter((b) => b.slot === slot && b.status === 'waitlisted');
		if (this.wrong === 'last-in-first') waiting.reverse();
		for (const booking of waiting) {
			if (this.#isFull(slot)) return;
			if (this.credits[booking.member]! < 1) continue;
			booking.status = 'booked';
			this.#pay(booking.member);
		}
	}

	#pay(member: number): void {
		if (this.wrong !== 'free') this.credits[member]! -= 1;
	}

	#isFull(slot: number): boolean {
		const inIt = this.bookings.filter(
			(b) => b.slot === slot && ['booked', 'attended'].includes(b.status)
		).length;
		const more = this.wrong === 'a-place-too-many' ? 1 : 0;
		return inIt >= this.slots[slot]!.places + more;
	}
}

const no = (said: string): Answer => ({ ok: false, said });

type Value = string | number | null;

const at = 1_700_000_000_000;
const made = { created_at: at };

/**
 * One row of every table of the first schema, parents before children, in the columns that it had.
 * A migration that adds a table adds its row to `laterRows`, with the number of migrations that
 * there were then.
 */
export const firstRows: [table: string, row: Record<string, Value>][] = [
	['people', { id: 1, name: 'Ada Byrne', email: 'ada@ropewalk.example', ...made }],
	['people', { id: 2, name: 'Niamh Corrigan', created_by_id: 1, ...made }],
	['person_roles', { person_id: 2, role: 'coach', granted_at: at, granted_by_id: 1 }],
	['sign_ins', { id: 'device', person_id: 1, last_seen_at: at, expires_at: at, ...made }],
	['sign_in_links', { token_hash: 'h', email: 'ada@ropewalk.example', expires_at: at, ...made }],
	[
		'gyms',
		{
			id: 1,
			name: 'Ropewalk',
			place_name: 'Galway',
			zone: 'Europe/Dublin',
			currency: 'EUR',
			...made
		}
	],
	['rooms', { id: 1, name: 'Long Floor', places: 18, ...made }],
	['kit_groups', { id: 1, name: 'rower', plural: 'rowers', ...made }],
	['kit_items', { id: 1, kit_group_id: 1, count: 6, room_id: 1, ...made }],
	['kit_spells', { id: 1, kit_item_id: 1, count: 1, from_at: at, why: 'chain', ...made }],
	[
		'movements',
		{
			id: 1,
			name: 'Row',
			pattern: 'conditioning',
			muscles: '[]',
			seconds_per_rep: 3,
			updated_at: at,
			...made
		}
	],
	['variations', { id: 1, movement_id: 1, name: 'On the rower', rung: 0 }],
	['variation_needs', { variation_id: 1, kit_group_id: 1 }],
	['programmes', { id: 1, name: 'Engine', ...made }],
	['training_sessions', { id: 1, programme_id: 1, title: 'Long rows', length_min: 60, ...made }],
	[
		'session_revisions',
		{
			id: 1,
			training_session_id: 1,
			number: 1,
			content: '{"blocks":[]}',
			created_by_id: 2,
			...made
		}
	],
	[
		'class_types',
		{ id: 1, name: 'Strength', length_min: 60, cut_off_min: 120, programme_id: 1, ...made }
	],
	[
		'series',
		{
			id: 1,
			class_type_id: 1,
			room_id: 1,
			starts_on: '2026-01-05',
			start_time: '18:40',
			length_min: 60,
			rule: 'FREQ=WEEKLY;BYDAY=MO',
			created_by_id: 2,
			...made
		}
	],
	['series_coaches', { series_id: 1, person_id: 2 }],
	[
		'slots',
		{
			id: 1,
			uid: 'slot-1',
			series_id: 1,
			recurrence_key: '2026-01-05T18:40',
			class_type_id: 1,
			room_id: 1,
			starts_on: '2026-01-05',
			start_time: '18:40',
			starts_at: at,
			ends_at: at + 3_600_000,
			session_revision_id: 1,
			modified_at: at,
			...made
		}
	],
	['slot_coaches', { slot_id: 1, person_id: 2 }],
	['clash_overrides', { id: 1, slot_uid: 'slot-1', kind: 'room', why: 'half each', at, by_id: 2 }],
	[
		'closures',
		{ id: 1, room_id: 1, from_on: '2026-12-24', to_on: '2026-12-26', why: 'rest', ...made }
	],
	['publications', { id: 1, week_on: '2026-01-05', at, by_id: 2, slots: 1 }],
	[
		'passes',
		{
			id: 1,
			person_id: 1,
			kind: 'pack',
			name: 'Ten',
			starts_on: '2026-01-01',
			created_by_id: 2,
			...made
		}
	],
	[
		'bookings',
		{ id: 1, slot_id: 1, person_id: 1, status: 'booked', pass_id: 1, updated_at: at, ...made }
	],
	['booking_changes', { id: 1, booking_id: 1, to_status: 'booked', at, by_id: 1 }],
	['ledger_transfers', { id: 1, kind: 'grant', at, by_id: 2, booking_id: 1 }],
	['ledger_entries', { id: 1, transfer_id: 1, account: 'issued', unit: 'credit', amount: -10 }],
	['ledger_entries', { id: 2, transfer_id: 1, account: 'pass:1', unit: 'credit', amount: 10 }],
	[
		'idempotency_keys',
		{
			id: 1,
			person_id: 1,
			key: 'k',
			route: '/api/slots/[id]/bookings',
			body_hash: 'h',
			status: 201,
			answer: '{}',
			...made
		}
	],
	['feeds', { id: 1, person_id: 1, kind: 'member', name: 'Phone', token_hash: 'h', ...made }],
	[
		'outbox_messages',
		{
			id: 1,
			kind: 'promoted',
			fact_key: 'booking:1:promoted',
			person_id: 1,
			to_address: 'ada@ropewalk.example',
			subject: 's',
			text: 't',
			html: 'h',
			message_id: '<1@localhost>',
			next_attempt_at: at,
			...made
		}
	],
	['audit_entries', { id: 1, at, actor_id: 2, verb: 'slots.lay', noun: 'slots', noun_id: 1 }]
];

/** Rows of tables that came later. */
export const laterRows: [since: number, table: string, row: Record<string, Value>][] = [
	[
		4,
		'stripe_events',
		{ id: 'evt_1', type: 'invoice.paid', happened_at: at, payload: '{}', received_at: at }
	]
];

/** The rows that a database of so many migrations holds. */
export const rowsAfter = (migrations: number) => [
	...firstRows,
	...laterRows
		.filter(([since]) => since <= migrations)
		.map(([, table, row]): [string, Record<string, Value>] => [table, row])
];

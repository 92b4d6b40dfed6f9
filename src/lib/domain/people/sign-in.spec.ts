import { describe, expect, it } from 'vitest';
import { signInLimits, stillCounts } from './sign-in';

const minute = 60_000;
const row = { lastSeenAt: 0, expiresAt: 12 * 60 * minute, revokedAt: null };

describe('how long a sign-in lasts', () => {
	it('ends for staff after 30 idle minutes and for a member after 14 idle days', () => {
		expect(stillCounts(row, ['coach'], 30 * minute - 1)).toBe(true);
		expect(stillCounts(row, ['coach'], 30 * minute)).toBe(false);
		const long = { ...row, expiresAt: Infinity };
		expect(stillCounts(long, ['member'], 14 * 24 * 60 * minute - 1)).toBe(true);
		expect(stillCounts(long, ['member'], 14 * 24 * 60 * minute)).toBe(false);
	});

	it('holds a member who is also staff to the limits of staff', () => {
		expect(signInLimits(['member', 'front_desk'])).toEqual(signInLimits(['front_desk']));
	});

	it('ends at its expiry however busy it was', () => {
		const busy = { ...row, lastSeenAt: row.expiresAt - 1 };
		expect(stillCounts(busy, ['owner'], row.expiresAt - 1)).toBe(true);
		expect(stillCounts(busy, ['owner'], row.expiresAt)).toBe(false);
	});

	it('ends at once when it is revoked', () => {
		expect(stillCounts({ ...row, revokedAt: 0 }, ['member'], 1)).toBe(false);
	});
});

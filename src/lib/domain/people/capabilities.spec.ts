import { describe, expect, it } from 'vitest';
import { capabilities, capabilitiesOf, roles } from './capabilities';

describe('what each role may do', () => {
	it('gives a member their own bookings and nothing else', () => {
		expect([...capabilitiesOf(['member'])]).toEqual(['bookings:write-own']);
	});

	it('gives somebody with two roles what either grants', () => {
		expect(capabilitiesOf(['coach', 'member'])).toEqual(
			new Set(['schedule:read-all', 'floor:read-own', 'bookings:write-own'])
		);
	});

	it('keeps money, roles, settings and the audit log from coaches and the desk', () => {
		const held = capabilitiesOf(['head_coach', 'coach', 'front_desk', 'member']);
		for (const owned of ['staff:write', 'settings:write', 'audit:read'] as const) {
			expect(held.has(owned)).toBe(false);
		}
	});

	it('grants every capability to somebody', () => {
		expect(capabilitiesOf(roles)).toEqual(new Set(capabilities));
	});

	it('grants nothing without a role', () => {
		expect(capabilitiesOf([]).size).toBe(0);
	});
});

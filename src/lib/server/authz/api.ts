import type { Rules } from './rule';

const members = ['bookings:write-own', 'bookings:write-any'] as const;
const rollTakers = ['roll:take', 'floor:read-own'] as const;

export const rules: Rules = {
	'/api/health': { GET: 'anyone' },
	'/api/openapi.json': { GET: 'anyone' },
	'/api/slots': { GET: 'anyone' },
	'/api/slots/[id=id]': { GET: 'anyone' },
	'/api/slots/[id=id]/kit': { GET: 'signed-in' },
	'/api/slots/[id=id]/bookings': { POST: members },
	'/api/slots/[id=id]/roll': { GET: rollTakers, PATCH: rollTakers },
	'/api/bookings/[id=id]': { DELETE: members },
	'/api/me/bookings': { GET: 'bookings:write-own' },
	'/api/stripe/webhook': { POST: 'anyone' }
};

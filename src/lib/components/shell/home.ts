/** Where somebody's day on the staff side begins, by what they may do; null for a member. */
export function staffHome(capabilities: readonly string[]): string | null {
	const homes: [string, string][] = [
		['schedule:write', '/plan/week'],
		['roll:take', '/desk'],
		['floor:read-own', '/floor'],
		['settings:write', '/office/settings']
	];
	return homes.find(([capability]) => capabilities.includes(capability))?.[1] ?? null;
}

/** One account a role, in a database that the demo seed made and nowhere else. */
export const demoAccounts = ['owner', 'head', 'coach', 'desk', 'member'].map(
	(name) => `${name}@ropewalk.example`
);
export const demoPassword = 'ropewalk-demo';

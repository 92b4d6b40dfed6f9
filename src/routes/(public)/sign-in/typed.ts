type Refused = {
	sentence?: string;
	values?: Record<string, unknown> | undefined;
	errors?: Record<string, string>;
};

/** What a refused sign-in form hands back, whichever of the two it was. */
export function typedIn(form: Refused | { sentTo: string } | null) {
	const refused: Refused = form && !('sentTo' in form) ? form : {};
	const email = refused.values?.email;
	return {
		sentence: refused.sentence,
		email: typeof email === 'string' ? email : '',
		errors: refused.errors ?? {}
	};
}

export const actionQuery = (action: string, to: string): string =>
	`?/${action}${action === 'password' ? '&with=password' : ''}${to ? `&to=${encodeURIComponent(to)}` : ''}`;

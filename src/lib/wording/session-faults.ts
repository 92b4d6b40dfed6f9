import * as m from './compiled/messages';

/** The sentence of a session's fault: "needs-cap" is the message `session_fault_needs_cap`. */
export function faultSentence(code: string): string {
	const sentences = m as unknown as Record<string, (() => string) | undefined>;
	return (
		sentences[`session_fault_${code.replaceAll('-', '_')}`]?.() ?? m.session_fault_unnamed({ code })
	);
}

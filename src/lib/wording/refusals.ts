import * as m from './compiled/messages';

type Sentence = (blanks: Record<string, string | number>) => string;

/** The sentence of a refusal code: "already-booked" is the message `refused_already_booked`. */
export function refusalSentence(
	code: string,
	detail: Record<string, string | number> = {}
): string {
	const sentences = m as unknown as Record<string, Sentence | undefined>;
	const sentence = sentences[`refused_${code.replaceAll('-', '_')}`];
	return sentence ? sentence(detail) : m.refused_unnamed({ code });
}

/** A rule's or a command's "no": a value, never an exception. `refused` is the code that page and API share. */
export type Refused<Code extends string = string> = {
	ok: false;
	refused: Code;
	detail?: Record<string, string | number>;
};

/** Builds a refusal; `detail` fills the blanks of its sentence in the message files. */
export function refuse<Code extends string>(
	code: Code,
	detail?: Record<string, string | number>
): Refused<Code> {
	return detail ? { ok: false, refused: code, detail } : { ok: false, refused: code };
}

import type { SeenSight } from './sight';

/** A form that was refused, as its action hands it back. */
export type RefusedForm = {
	refused: string;
	sentence: string;
	values: Record<string, string | string[]>;
	errors: Record<string, string>;
	sight: SeenSight | null;
};

/** The refusal among what the actions of a page may answer; null where there is none. */
export const refusedOf = (form: { refused?: string } | null | undefined): RefusedForm | null =>
	form?.refused === undefined ? null : (form as RefusedForm);

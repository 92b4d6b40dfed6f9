import * as m from './compiled/messages';

const words: Record<string, () => string> = {
	squat: m.library_pattern_squat,
	hinge: m.library_pattern_hinge,
	'horizontal push': m.library_pattern_horizontal_push,
	'vertical push': m.library_pattern_vertical_push,
	'horizontal pull': m.library_pattern_horizontal_pull,
	'vertical pull': m.library_pattern_vertical_pull,
	lunge: m.library_pattern_lunge,
	carry: m.library_pattern_carry,
	trunk: m.library_pattern_trunk,
	conditioning: m.library_pattern_conditioning,
	mobility: m.library_pattern_mobility
};

export const patternWord = (pattern: string): string => words[pattern]?.() ?? pattern;

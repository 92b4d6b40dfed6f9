import type { ParamMatcher } from '@sveltejs/kit';
import { isCivilDate } from '$lib/domain/calendar/civil-date';

/** A civil date that exists: 2026-12-01. */
export const match: ParamMatcher = (param) => isCivilDate(param);

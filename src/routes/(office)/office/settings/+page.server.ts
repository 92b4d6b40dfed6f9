import { gymForm } from '$lib/forms/gym';
import { readForm } from '$lib/forms/read-form';
import { requireViewer } from '$lib/server/guard';
import { changeSettings } from '$lib/server/gym/change-settings';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import { gymChoices } from '$lib/wording/gym-choices';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = (event) => {
	requireViewer(event, 'settings:write');
	return { choices: gymChoices() };
};

export const actions = {
	default: async (event) => {
		const viewer = requireViewer(event, 'settings:write');
		const read = readForm(gymForm, await safeForm(event));
		if (!read.ok) return failWith({ ok: false, refused: 'bad-input' }, read.values, read.errors);
		const changed = await changeSettings(viewer, read.data, event.locals);
		return changed.ok ? { saved: true } : failWith(changed, read.typed);
	}
} satisfies Actions;

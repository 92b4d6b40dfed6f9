import type { LayoutServerLoad } from './$types';

/** What every page shows around itself: the gym, who is signed in, and their theme. */
export const load: LayoutServerLoad = ({ locals }) => {
	const { gym, viewer, theme } = locals;
	return {
		gym: gym && {
			name: gym.name,
			placeName: gym.placeName,
			zone: gym.zone,
			currency: gym.currency,
			locale: gym.locale,
			loadUnit: gym.loadUnit,
			weekStartsOn: gym.weekStartsOn
		},
		viewer: viewer && {
			name: viewer.name,
			personId: viewer.personId,
			roles: viewer.roles,
			capabilities: [...viewer.capabilities]
		},
		theme
	};
};

import type { Role } from '$lib/domain/people/capabilities';
import * as m from './compiled/messages';

const names: Record<Role, () => string> = {
	owner: m.common_role_owner,
	head_coach: m.common_role_head_coach,
	coach: m.common_role_coach,
	front_desk: m.common_role_front_desk,
	member: m.common_role_member
};

export const roleName = (role: Role): string => names[role]();

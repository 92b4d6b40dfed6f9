import { z } from 'zod';
import { roles } from '$lib/domain/people/capabilities';
import { mailAddress } from '$lib/domain/people/mail-address';
import { personName } from './new-password';

const personId = z.coerce.number().int().min(1).max(Number.MAX_SAFE_INTEGER);

export const inviteForm = z.object({
	name: personName,
	email: mailAddress,
	role: z.enum(roles).exclude(['member'])
});
export type Invitation = z.infer<typeof inviteForm>;

export const roleForm = z.object({ personId, role: z.enum(roles) });
export const personForm = z.object({ personId });

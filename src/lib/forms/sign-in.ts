import { z } from 'zod';
import { mailAddress } from '$lib/domain/people/mail-address';
import { longestPassword } from '$lib/domain/people/password';

export const linkForm = z.object({ email: mailAddress });
export const passwordForm = z.object({
	email: mailAddress,
	password: z.string().min(1).max(longestPassword)
});
export const followForm = z.object({ email: mailAddress, token: z.string().min(1).max(200) });

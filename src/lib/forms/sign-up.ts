import { z } from 'zod';
import { mailAddress } from '$lib/domain/people/mail-address';
import { newPassword, personName } from './new-password';
import { orNothing } from './read-form';

/** Without a password, a link is mailed instead. */
export const signUpForm = z.object({
	name: personName,
	email: mailAddress,
	password: orNothing(newPassword)
});
export type SignUp = z.infer<typeof signUpForm>;

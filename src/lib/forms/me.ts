import { z } from 'zod';

export const feedForm = z.object({
	name: z.string().trim().min(1).max(60),
	kind: z.enum(['member', 'coach', 'public'])
});

export const feedId = z.object({ feedId: z.coerce.number().int().positive() });

export const aboutMe = z.object({
	name: z.string().trim().min(1).max(120),
	phone: z.string().trim().max(40).default(''),
	note: z.string().trim().max(500).default('')
});

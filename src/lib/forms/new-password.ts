import { z } from 'zod';
import { longestPassword, shortestPassword } from '$lib/domain/people/password';

export const newPassword = z.string().min(shortestPassword).max(longestPassword);
export const personName = z.string().trim().min(1).max(80);

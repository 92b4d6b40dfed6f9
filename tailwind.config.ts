import type { Config } from 'tailwindcss';

/** Every colour is a variable: app.css gives each its light and its dark value. */
const token = (name: string) => `var(--${name})`;

export default {
	content: [],
	theme: {
		extend: {
			colors: {
				bg: token('bg'),
				surface: token('surface')
			},
			fontFamily: { sans: ['Outfit', 'system-ui', 'sans-serif'] }
		}
	}
} satisfies Config;

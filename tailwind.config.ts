import type { Config } from 'tailwindcss';

/** Every colour is a variable: app.css gives each its light and its dark value. */
const token = (name: string) => `var(--${name})`;
const tokens = (...names: string[]) => Object.fromEntries(names.map((name) => [name, token(name)]));

export default {
	content: [],
	theme: {
		extend: {
			colors: tokens(
				'bg',
				'surface',
				'sunken',
				'ink',
				'muted',
				'line',
				'edge',
				'bar',
				'bar-ink',
				'bar-muted',
				'bar-raised',
				'pine',
				'on-pine',
				'pine-ink',
				'pine-tint',
				'brass',
				'brass-ink',
				'brass-tint',
				'clay',
				'clay-ink',
				'clay-tint',
				'slate',
				'slate-ink',
				'slate-tint',
				'on-slate',
				'effort-1',
				'effort-2',
				'effort-3',
				'effort-4',
				'effort-5',
				'effort-1-text',
				'effort-2-text',
				'effort-3-text',
				'effort-4-text',
				'effort-5-text',
				'room-1',
				'room-2'
			),
			fontFamily: { sans: ['Outfit', 'system-ui', 'sans-serif'] },
			fontSize: {
				hero: ['58px', { lineHeight: '61px', letterSpacing: '-0.015em' }],
				title: ['34px', { lineHeight: '39px', letterSpacing: '-0.015em' }],
				h1: ['28px', { lineHeight: '34px', letterSpacing: '-0.015em' }],
				h2: ['20px', { lineHeight: '26px' }],
				h3: ['16px', { lineHeight: '22px' }],
				body: ['14px', { lineHeight: '20px' }],
				small: ['13px', { lineHeight: '18px' }],
				least: ['12px', { lineHeight: '16px' }],
				tick: ['11px', { lineHeight: '14px' }]
			},
			borderRadius: { tag: '6px', button: '10px', card: '14px', phone: '18px' },
			boxShadow: { card: 'var(--shadow-card)', lifted: 'var(--shadow-lifted)' },
			// In rem like the built-in ones: widths of other units cannot be put in order.
			screens: { desk: '64rem' }
		}
	}
} satisfies Config;

// Development: the demo's gym in a database of its own, served from the sources, offline.
import { join } from 'node:path';
import { root, run, secret, start } from './start.js';

const port = Number(process.env.PORT || 5173);

run('npm', ['run', 'wording']);
// vite is started by node itself: a shell in between would keep it alive after us.
start(
	'node',
	[
		join(root, 'node_modules', 'vite', 'bin', 'vite.js'),
		'dev',
		'--port',
		String(port),
		'--strictPort'
	],
	{
		KITHOUR_MODE: 'development',
		PORT: String(port),
		ORIGIN: process.env.ORIGIN || `http://localhost:${port}`,
		DATABASE_URL: process.env.DATABASE_URL || `file:${join(root, 'data', 'dev.db')}`,
		AUTH_SECRET: process.env.AUTH_SECRET || secret('dev.secret')
	}
);

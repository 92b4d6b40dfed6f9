import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import floors from './min-versions.json';

type Lock = {
	packages: Record<string, { version?: string; resolved?: string; hasInstallScript?: boolean }>;
};

/** Locked packages below an advisory's floor. */
function belowFloor(lock: Lock): string[] {
	return floors.floors.flatMap(({ package: name, floor }) =>
		Object.entries(lock.packages)
			.filter(([path]) => path === `node_modules/${name}` || path.endsWith(`/node_modules/${name}`))
			.filter(([, { version }]) => version !== undefined && older(version, floor))
			.map(([path, { version }]) => `${path} ${version} < ${floor}`)
	);
}

function older(version: string, floor: string): boolean {
	const [a, b] = [version, floor].map((v) => v.split('-')[0]!.split('.').map(Number));
	for (let i = 0; i < 3; i += 1) {
		if ((a![i] ?? 0) !== (b![i] ?? 0)) return (a![i] ?? 0) < (b![i] ?? 0);
	}
	return false;
}

const lock: Lock = JSON.parse(readFileSync('package-lock.json', 'utf8'));
const manifest = JSON.parse(readFileSync('package.json', 'utf8'));

describe('what we depend on (G28)', () => {
	it('has no locked version below an advisory floor', () => {
		expect(belowFloor(lock)).toEqual([]);
	});

	it('is seen to reject a lock with an old version, nested or not', () => {
		const broken = {
			packages: {
				'node_modules/cookie': { version: '0.6.0' },
				'node_modules/@auth/core/node_modules/nodemailer': { version: '7.0.13' },
				'node_modules/drizzle-orm': { version: '0.45.4' }
			}
		};
		expect(belowFloor(broken)).toEqual([
			'node_modules/cookie 0.6.0 < 0.7.0',
			'node_modules/@auth/core/node_modules/nodemailer 7.0.13 < 9.1.1'
		]);
	});

	it('pins every version exactly', () => {
		const versions = Object.values({ ...manifest.dependencies, ...manifest.devDependencies });
		expect(versions.filter((v) => !/^\d+\.\d+\.\d+$/.test(String(v)))).toEqual([]);
	});

	it('locks every package that a floor names and that is installed', () => {
		const present = floors.floors.filter((f) => lock.packages[`node_modules/${f.package}`]);
		expect(present.map((f) => f.package)).toContain('cookie');
		expect(present.length).toBeGreaterThanOrEqual(4);
	});
});

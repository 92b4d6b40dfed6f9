import type { z } from 'zod';
import type { Format, TimedBlock, Work } from './length';

/** The faults of a session that no single field shows; each is the key of a sentence. */
export const sessionFaults = [
	'bad-id',
	'bad-tempo',
	'twice',
	'needs-prescription',
	'needs-sets',
	'needs-work',
	'needs-speed',
	'needs-rounds',
	'needs-work-time',
	'needs-rest-time',
	'needs-cap',
	'needs-length',
	'two-measures',
	'upside-down'
] as const;
export type SessionFaultCode = (typeof sessionFaults)[number];

type CheckedPrescription = Work & {
	id: string;
	load: { kind: 'any' } | { kind: 'kg'; minKg: number; maxKg: number };
};
type CheckedBlock = Omit<TimedBlock, 'prescriptions'> & {
	id: string;
	prescriptions: CheckedPrescription[];
};
type Report = (path: (string | number)[], code: SessionFaultCode) => void;

/** What each format cannot do without, beside set-up and waves. */
const needs: Record<Format, { block: (keyof typeof blockNeeds)[]; prescriptions: boolean }> = {
	straight: { block: [], prescriptions: true },
	superset: { block: ['rounds'], prescriptions: true },
	rounds: { block: ['rounds'], prescriptions: true },
	'every-minute': { block: ['rounds'], prescriptions: true },
	intervals: { block: ['rounds', 'workS', 'restS'], prescriptions: true },
	'timed-circuit': { block: ['capS'], prescriptions: false },
	'as-many-rounds': { block: ['capS'], prescriptions: false },
	'for-time': { block: ['capS'], prescriptions: false },
	free: { block: ['typedS'], prescriptions: false }
};

const blockNeeds = {
	rounds: 'needs-rounds',
	workS: 'needs-work-time',
	restS: 'needs-rest-time',
	capS: 'needs-cap',
	typedS: 'needs-length'
} as const;

/** Formats whose length is summed from the work of each prescription. */
const summed: readonly Format[] = ['straight', 'superset', 'rounds'];

export function checkSession(
	content: { blocks: CheckedBlock[] },
	ctx: z.core.$RefinementCtx<unknown>
) {
	const report: Report = (path, code) => ctx.addIssue({ code: 'custom', path, message: code });
	const blockIds = new Set<string>();
	const prescriptionIds = new Set<string>();
	content.blocks.forEach((block, b) => {
		once(blockIds, block.id, ['blocks', b, 'id'], report);
		checkBlock(block, ['blocks', b], report);
		block.prescriptions.forEach((prescription, p) => {
			const path = ['blocks', b, 'prescriptions', p];
			once(prescriptionIds, prescription.id, [...path, 'id'], report);
			checkPrescription(prescription, block.format, path, report);
		});
	});
}

function once(seen: Set<string>, id: string, path: (string | number)[], report: Report) {
	if (seen.has(id)) report(path, 'twice');
	seen.add(id);
}

/** Rounds are what is done, so they are asked for even where the length is typed; times are not. */
function checkBlock(block: CheckedBlock, path: (string | number)[], report: Report) {
	const { block: fields, prescriptions } = needs[block.format];
	for (const field of fields) {
		const isTypedAway = field !== 'rounds' && block.typedS !== undefined;
		if (block[field] === undefined && !isTypedAway) report([...path, field], blockNeeds[field]);
	}
	if (prescriptions && block.prescriptions.length === 0)
		report([...path, 'prescriptions'], 'needs-prescription');
}

function checkPrescription(
	prescription: CheckedPrescription,
	format: Format,
	path: (string | number)[],
	report: Report
) {
	const measures = (['reps', 'expectedReps', 'seconds', 'metres', 'calories'] as const).filter(
		(measure) => prescription[measure] !== undefined
	);
	if (measures[1]) report([...path, measures[1]], 'two-measures');
	if (format === 'straight' && prescription.sets === undefined)
		report([...path, 'sets'], 'needs-sets');
	if (summed.includes(format)) checkWork(prescription, measures.length > 0, path, report);
	const { load } = prescription;
	if (load.kind === 'kg' && load.minKg > load.maxKg) report([...path, 'load'], 'upside-down');
}

function checkWork(
	prescription: CheckedPrescription,
	isMeasured: boolean,
	path: (string | number)[],
	report: Report
) {
	if (!isMeasured) report([...path, 'reps'], 'needs-work');
	if (prescription.metres !== undefined && prescription.metresPerSecond === undefined)
		report([...path, 'metresPerSecond'], 'needs-speed');
	if (prescription.calories !== undefined && prescription.caloriesPerMinute === undefined)
		report([...path, 'caloriesPerMinute'], 'needs-speed');
}

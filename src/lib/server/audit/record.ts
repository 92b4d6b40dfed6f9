import type { Tx } from '../db';
import { auditEntries } from '../db/schema';

export type AuditFact = {
	viewer: { personId: number } | null;
	verb: string;
	noun: string;
	nounId?: number;
	now: number;
	detail?: Record<string, unknown>;
};

/** Writes who did what into the audit log, in the transaction of the command itself. */
export async function audit(tx: Tx, fact: AuditFact): Promise<void> {
	await tx.insert(auditEntries).values({
		at: fact.now,
		actorId: fact.viewer?.personId ?? null,
		verb: fact.verb,
		noun: fact.noun,
		nounId: fact.nounId ?? null,
		detail: fact.detail ?? {}
	});
}

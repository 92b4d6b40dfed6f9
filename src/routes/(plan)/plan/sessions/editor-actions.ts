import { readForm } from '$lib/forms/read-form';
import { sessionForm } from '$lib/forms/session';
import { refuse } from '$lib/domain/refusal';
import { failWith } from '$lib/server/refuse';
import type { SaveRefusal, SessionDraft } from '$lib/server/sessions/save';
import { faultSentence } from '$lib/wording/session-faults';

type Draft = Omit<SessionDraft, 'now'>;

/** Reads the editor's form, hands it to a command, and turns a refusal into one sentence a place. */
export async function withDraft<Saved extends { ok: true }>(
	form: FormData,
	save: (draft: Draft) => Promise<Saved | SaveRefusal>
) {
	const read = readForm(sessionForm, form);
	if (!read.ok) return failWith(refuse('bad-input'), undefined, read.errors);
	const { programmeId, ...draft } = read.data;
	const saved = await save({ ...draft, programmeId: programmeId ?? null });
	if (saved.ok) return saved;
	if (saved.refused !== 'session-malformed' || !('faults' in saved)) return failWith(saved);
	const errors: Record<string, string> = {};
	for (const { path, code } of saved.faults) errors[path.join('.')] ??= faultSentence(code);
	return failWith(saved, undefined, errors);
}

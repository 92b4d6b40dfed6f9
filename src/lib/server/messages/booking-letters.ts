import * as m from '$lib/wording/compiled/messages';
import { setLetter } from './letter';
import type { Letter } from './queue';

export type BookingFacts = {
	name: string;
	gymName: string;
	className: string;
	day: string;
	time: string;
	/** The class's page, as a whole address. */
	href: string;
};

const letter = (facts: BookingFacts, subject: string, paragraphs: string[]): Letter =>
	setLetter({
		subject,
		greeting: m.account_mail_greeting({ name: facts.name }),
		paragraphs,
		button: { label: m.mail_open_class(), href: facts.href },
		gymName: facts.gymName
	});

const when = ({ className, day, time }: BookingFacts) => ({ class: className, day, time });

export const promotedLetter = (facts: BookingFacts): Letter =>
	letter(facts, m.mail_promoted_subject(when(facts)), [m.mail_promoted_body(when(facts))]);

export const cancelledByStaffLetter = (facts: BookingFacts): Letter =>
	letter(facts, m.mail_cancelled_by_staff_subject(when(facts)), [
		m.mail_cancelled_by_staff_body(when(facts))
	]);

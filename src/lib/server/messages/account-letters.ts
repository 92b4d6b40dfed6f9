import * as m from '$lib/wording/compiled/messages';
import { setLetter } from './letter';
import type { Letter } from './queue';

type Named = { name: string; gymName: string; href: string };

export const linkLetter = ({ name, gymName, href }: Named): Letter =>
	setLetter({
		subject: m.account_mail_link_subject({ gym: gymName }),
		greeting: m.account_mail_greeting({ name }),
		paragraphs: [m.account_mail_link_body({ gym: gymName })],
		button: { label: m.account_mail_link_button(), href },
		notes: [m.account_mail_link_expiry(), m.account_mail_link_not_you()],
		gymName
	});

export const invitationLetter = (to: Named & { inviter: string; role: string }): Letter =>
	setLetter({
		subject: m.account_mail_invite_subject({ gym: to.gymName }),
		greeting: m.account_mail_greeting({ name: to.name }),
		paragraphs: [
			m.account_mail_invite_body({ inviter: to.inviter, gym: to.gymName, role: to.role }),
			m.account_mail_invite_how()
		],
		button: { label: m.account_mail_invite_button(), href: to.href },
		gymName: to.gymName
	});

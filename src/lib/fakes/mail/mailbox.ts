export type Mail = {
	id: number;
	receivedAt: Date;
	to: string[];
	from: string;
	subject: string;
	text: string;
	html: string | null;
	messageId: string;
	attachments: { name: string; type: string; content: Buffer }[];
};

export type Mailbox = ReturnType<typeof createMailbox>;

/** The newest mails, in memory: a restart empties the inbox, the gym's data stays. */
export function createMailbox(most = 500) {
	let mails: Mail[] = [];
	let last = 0;
	return {
		add(mail: Omit<Mail, 'id'>): void {
			last += 1;
			mails = [{ ...mail, id: last }, ...mails].slice(0, most);
		},
		/** Newest first; only those to `address` when one is given. */
		all: (address?: string): Mail[] =>
			address ? mails.filter((mail) => mail.to.includes(address)) : mails,
		find: (id: number): Mail | undefined => mails.find((mail) => mail.id === id)
	};
}

import type { Role } from '$lib/domain/people/capabilities';

/** Staff of the demo gym; all invented. The key is the left side of the address. */
export const staff: { key: StaffKey; name: string; roles: Role[] }[] = [
	{ key: 'owner', name: 'Maeve Costello', roles: ['owner'] },
	{ key: 'head', name: 'Niamh Corrigan', roles: ['head_coach', 'member'] },
	{ key: 'coach', name: 'Tomasz Wilk', roles: ['coach', 'member'] },
	{ key: 'adaeze', name: 'Adaeze Obi', roles: ['coach'] },
	{ key: 'ruairi', name: 'Ruairi Keane', roles: ['coach'] },
	{ key: 'desk', name: 'Bríd Molloy', roles: ['front_desk'] }
];
export type StaffKey = 'owner' | 'head' | 'coach' | 'adaeze' | 'ruairi' | 'desk';

/** `member@` first, then the regulars of every screen: `member001@` and on. */
export const firstMembers = [
	'Sorcha Finnerty',
	'Aoife Tarpey',
	'Cillian Moran',
	'Dara Kilbane',
	'Eimear Fahy',
	'Fintan Joyce',
	'Lorcan Breen',
	'Nuala Staunton',
	'Gráinne Hoban',
	'Iarla Conroy',
	'Sadhbh Lally',
	'Oran Tuohy',
	'Muireann Daly'
];

const words = (text: string) => text.split(' ');

/** Who lives in Galway, roughly: the share of names from each place. */
export const origins = [
	{
		share: 0.58,
		first: words(
			'Aoife Cillian Dara Eimear Fintan Gráinne Iarla Lorcan Nuala Oran Peadar Sadhbh Tadhg Una Rónán Ciara Donal Fiadh Killian Orla Bláthnaid Cormac Deirdre Eoghan Fergal Gobnait Íde Malachy Nóra Pádraig Róisín Senan'
		),
		last: words(
			'Tarpey Moran Kilbane Fahy Joyce Breen Staunton Hoban Conroy Lally Tuohy Daly Ruane Geraghty Folan Keogh Mannion Burke Coyne Nolan Quirke Walsh Flynn Duffy Heneghan Lydon Naughton Broderick Cunniffe Gilmore'
		)
	},
	{
		share: 0.14,
		first: words('Agnieszka Bartek Kasia Marek Zofia Paweł Ewa Piotr Magda Wojtek'),
		last: words('Nowak Mazur Wrona Dudek Pawlak Sikora Baran Zając Krawczyk Gajda')
	},
	{
		share: 0.1,
		first: words('Chidi Ngozi Emeka Ifeoma Tunde Yewande Obinna Folake Kelechi Amara'),
		last: words('Okafor Adeyemi Eze Nwosu Balogun Onyeka Adebayo Okoro Uche')
	},
	{
		share: 0.1,
		first: words('Rafael Larissa Thiago Beatriz Mateus Ana Caio Júlia Renata Vinícius'),
		last: words('Silva Costa Moreira Ribeiro Ferreira Santos Teixeira Barros Nogueira')
	},
	{
		share: 0.08,
		first: words('Priya Arjun Meera Vikram Yusuf Leila Hana Omar Elena Jonas'),
		last: words('Sharma Patel Nair Rao Haddad Khan Demir Petrova Larsen Sato')
	}
];

/** What members tell their coach; most say nothing. */
export const notes = [
	'Left shoulder, easy overhead.',
	'Coming back after a knee operation; cleared by my physio.',
	'Asthma, inhaler in my bag.',
	'Sore wrists: fists instead of flat hands.',
	'Twenty weeks pregnant, doctor says carry on.',
	'High blood pressure, on tablets; my doctor knows that I train.'
];

/** What is said with one booking. */
export const bookingNotes = [
	'First one back after a cold.',
	'I have to leave at ten to.',
	'Could we go through the pull-up grip again?',
	'Back is stiff today, going light.',
	'My sister is coming to watch.'
];

/** What the desk sells, in cents. */
export const passKinds = {
	unlimited: {
		kind: 'membership',
		name: 'Membership, unlimited',
		perWeek: null,
		priceCents: 11500
	},
	three: { kind: 'membership', name: 'Membership, 3 a week', perWeek: 3, priceCents: 9500 },
	two: { kind: 'membership', name: 'Membership, 2 a week', perWeek: 2, priceCents: 7200 },
	pack: { kind: 'pack', name: 'Pack of 10', perWeek: null, priceCents: 13000 },
	staff: { kind: 'membership', name: 'Staff', perWeek: null, priceCents: 0 }
} as const;
export type PassKind = keyof typeof passKinds;
export const packCredits = 10;

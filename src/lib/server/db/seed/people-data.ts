/** Staff of the demo gym; all invented. The key is the left side of the address. */
export const staff = [
	{ key: 'owner', name: 'Maeve Costello', roles: ['owner'] },
	{ key: 'head', name: 'Niamh Corrigan', roles: ['head_coach', 'member'] },
	{ key: 'coach', name: 'Tomasz Wilk', roles: ['coach', 'member'] },
	{ key: 'adaeze', name: 'Adaeze Obi', roles: ['coach'] },
	{ key: 'ruairi', name: 'Ruairi Keane', roles: ['coach'] },
	{ key: 'desk', name: 'Bríd Molloy', roles: ['front_desk'] }
] as const;

export const firstNames =
	'Aoife Cillian Dara Eimear Fintan Gráinne Iarla Lorcan Nuala Oran Peadar Sadhbh Tadhg Una Rónán Ciara Donal Fiadh Killian Orla Agnieszka Bartek Kasia Marek Zofia Pawel Chidi Ngozi Emeka Ifeoma Rafael Larissa Thiago Beatriz Mateus Priya Arjun Meera Vikram Ana Lucia Pedro Hana Yusuf Leila Omar Elena Dmitri Sofia Jonas'.split(
		' '
	);
export const lastNames =
	'Tarpey Moran Kilbane Fahy Joyce Breen Staunton Hoban Conroy Lally Tuohy Daly Ruane Geraghty Folan Nowak Kaminski Zielinska Mazur Okafor Adeyemi Eze Nwosu Silva Costa Moreira Ribeiro Sharma Patel Nair Rao Ferreira Santos Sato Demir Haddad Khan Petrova Ivanov Larsen Keogh Mannion Burke Coyne Nolan Quirke Walsh Flynn Duffy Heneghan'.split(
		' '
	);

/** What members tell their coach; most say nothing. */
export const notes = [
	'Left shoulder, easy overhead.',
	'Coming back after a knee operation; cleared by my physio.',
	'Asthma, inhaler in my bag.',
	'Sore wrists: fists instead of flat hands.',
	'Twenty weeks pregnant, doctor says carry on.'
];

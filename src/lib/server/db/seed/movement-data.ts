import type { patterns } from '../schema';
import type { GroupKey } from './kit-data';

export type SeedNeed = { group: GroupKey; quantity: number; peoplePerPiece: number };
export type SeedRung = { name: string; needs: SeedNeed[] };
export type SeedMovement = {
	name: string;
	pattern: (typeof patterns)[number];
	muscles: string[];
	secondsPerRep: number;
	perSide: boolean;
	cues: string;
	cautions: string;
	/** Hardest first. */
	ladder: SeedRung[];
};

/** Reads "kb", "kb*2" (two of them) and "box/2" (two people to one). */
function need(text: string): SeedNeed {
	const [, group, sign, number] = /^([a-z]+)(?:([*/])(\d))?$/.exec(text)!;
	return {
		group: group as GroupKey,
		quantity: sign === '*' ? Number(number) : 1,
		peoplePerPiece: sign === '/' ? Number(number) : 1
	};
}

/** Reads "Ring row: rings" and "Prone row on the floor". */
function rung(text: string): SeedRung {
	const [name, needs] = text.split(': ');
	return { name: name!, needs: needs ? needs.split(' ').map(need) : [] };
}

const movement = (
	name: string,
	pattern: SeedMovement['pattern'],
	muscles: string,
	secondsPerRep: number,
	cues: string,
	cautions: string,
	ladder: string[],
	perSide = false
): SeedMovement => ({
	name,
	pattern,
	muscles: muscles.split(' '),
	secondsPerRep,
	perSide,
	cues,
	cautions,
	ladder: ladder.map(rung)
});

const sharp = 'Stop if anything hurts sharply, and tell the coach.';
const back = 'Keep the back long; set the weight down as soon as it rounds.';
const doctor =
	'Chest pain or dizzy: stop at once and call the coach. With a heart condition or high blood pressure, ask your doctor before going all out.';
const pregnant = 'Pregnant or lately so: ask your doctor or physio first, and tell the coach.';

/** Sixty movements with their ladders. Needs are what each way really takes. */
export const movementData: SeedMovement[] = [
	movement(
		'Goblet squat',
		'squat',
		'quads glutes',
		4,
		'Elbows inside the knees, heels down.',
		`Knees follow the toes. ${sharp}`,
		[
			'Goblet squat, kettlebell: kb',
			'Goblet squat, one dumbbell of a pair: db',
			'Squat to a box: box',
			'Air squat'
		]
	),
	movement(
		'Front squat, dumbbells',
		'squat',
		'quads glutes trunk',
		4,
		'Elbows high, sit between the hips.',
		`Wrists sore: hold the bells at the sides. ${sharp}`,
		['Front squat, dumbbell pair: db', 'Front squat, one kettlebell: kb', 'Tempo air squat']
	),
	movement(
		'Box squat',
		'squat',
		'quads glutes',
		4,
		'Sit back, touch, stand without rocking.',
		'Check that the box stands firmly before you sit.',
		['Box squat with a dumbbell pair: box db', 'Box squat: box', 'Squat to a wall behind you']
	),
	movement(
		'Wall sit',
		'squat',
		'quads',
		1,
		'Thighs level, whole back on the wall.',
		'Dizzy or short of breath: stand up slowly.',
		['Wall sit with a dumbbell pair: db', 'Wall sit', 'Wall sit, higher']
	),
	movement(
		'Squat jump',
		'squat',
		'quads calves',
		2,
		'Land quietly, knees soft.',
		'Not with a sore knee or late in pregnancy: squat without the jump.',
		['Squat jump', 'Fast squat, heels stay down']
	),
	movement(
		'Cossack squat',
		'squat',
		'adductors glutes',
		4,
		'Sit to one side, the other leg long.',
		`Only as deep as the groin lets you. ${sharp}`,
		[
			'Cossack squat with a kettlebell: kb',
			'Cossack squat',
			'Side lunge, hands on a box: box',
			'Side lunge'
		],
		true
	),
	movement(
		'Romanian deadlift',
		'hinge',
		'hamstrings glutes back',
		4,
		'Push the hips back, bells close to the legs.',
		back,
		[
			'Romanian deadlift, dumbbell pair: db',
			'Romanian deadlift, one kettlebell: kb',
			'Romanian deadlift, band under the feet: band',
			'Good morning, hands on the hips'
		]
	),
	movement(
		'Kettlebell deadlift',
		'hinge',
		'glutes hamstrings back',
		4,
		'Bell between the ankles, chest proud.',
		back,
		['Deadlift, kettlebell: kb', 'Deadlift, dumbbell pair: db', 'Hip hinge to a wall']
	),
	movement(
		'Swing',
		'hinge',
		'glutes hamstrings back',
		2,
		'Hips throw the bell, arms only hold it.',
		`Look round before you swing. ${back}`,
		['Two-handed swing: kb', 'Swing with a band: band', 'Quick hip hinge, hands free']
	),
	movement(
		'Hip thrust',
		'hinge',
		'glutes',
		3,
		'Ribs down, squeeze at the top.',
		'Feel it in the lower back: come down a hand’s width.',
		[
			'Hip thrust on a bench, dumbbell pair: bench db',
			'Hip thrust on a bench: bench',
			'Glute bridge with a band: band mat',
			'Glute bridge: mat',
			'Glute bridge on the floor'
		]
	),
	movement(
		'Single-leg deadlift',
		'hinge',
		'hamstrings glutes',
		4,
		'Hips square, back leg reaches.',
		'Hold on to something if balance is short.',
		[
			'Single-leg deadlift, dumbbell pair: db',
			'Single-leg deadlift, one kettlebell: kb',
			'Single-leg deadlift, hand on a box: box',
			'Single-leg deadlift, hand on the wall'
		],
		true
	),
	movement(
		'Single-leg bridge',
		'hinge',
		'glutes hamstrings',
		3,
		'Drive through the heel.',
		`Cramp in the hamstring: both feet down. ${sharp}`,
		[
			'Single-leg bridge, foot on a bench: bench',
			'Single-leg bridge on a mat: mat',
			'Single-leg bridge on the floor'
		],
		true
	),
	movement(
		'Press-up',
		'horizontal push',
		'chest triceps',
		3,
		'One line from head to heels.',
		'Wrists sore: fists, or hands on dumbbells.',
		[
			'Press-up on rings: rings',
			'Full press-up',
			'Press-up, hands on a box: box',
			'Press-up, hands on a bench: bench',
			'Press-up, hands on the wall'
		]
	),
	movement(
		'Floor press',
		'horizontal push',
		'chest triceps',
		4,
		'Pause when the elbows touch.',
		'Ask for a hand with the first rep; roll the bells off, never drop them.',
		[
			'Floor press, dumbbell pair: db',
			'Floor press, one kettlebell at a time: kb',
			'Floor press, band round the back: band',
			'Slow press-up from the knees'
		]
	),
	movement(
		'Bench press, dumbbells',
		'horizontal push',
		'chest triceps',
		4,
		'Feet flat, wrists over elbows.',
		`Somebody stands by for heavy sets; roll the bells off, never drop them. ${sharp}`,
		['Bench press, dumbbell pair: bench db', 'Floor press, dumbbell pair: db']
	),
	movement(
		'Ring dip',
		'horizontal push',
		'chest triceps',
		3,
		'Rings still before you bend.',
		`Shoulders sore: leave it out today. ${sharp}`,
		['Ring dip: rings', 'Dip between boxes: box*2', 'Bench dip, knees bent: bench']
	),
	movement(
		'Band chest press',
		'horizontal push',
		'chest triceps',
		3,
		'Step out until the band is lively.',
		'Look at the band first: a split one goes in the bin.',
		['Band chest press, standing: band', 'Band chest press, half-kneeling: band mat']
	),
	movement(
		'Shoulder press',
		'vertical push',
		'shoulders triceps',
		3,
		'Ribs down, biceps by the ears.',
		`Sore overhead: press at an angle or with a band. ${sharp}`,
		[
			'Shoulder press, dumbbell pair: db',
			'Shoulder press, one kettlebell: kb',
			'Shoulder press, band under the foot: band',
			'Pike press-up from the knees',
			'Wall slide'
		]
	),
	movement(
		'Push press',
		'vertical push',
		'shoulders quads',
		3,
		'Dip, drive, lock; head through at the top.',
		`Wrists or shoulders sore: press lighter and without the dip. ${sharp}`,
		[
			'Push press, dumbbell pair: db',
			'Push press, kettlebell: kb',
			'Push press, band: band',
			'Pike press-up'
		]
	),
	movement(
		'Half-kneeling press',
		'vertical push',
		'shoulders trunk',
		3,
		'Squeeze the down-side glute.',
		`A mat under the knee. Sore overhead: stop at the forehead. ${sharp}`,
		[
			'Half-kneeling press, dumbbells in turn: db mat',
			'Half-kneeling press, kettlebell: kb mat',
			'Half-kneeling press, band: band mat',
			'Half-kneeling reach'
		],
		true
	),
	movement(
		'Pike press-up',
		'vertical push',
		'shoulders triceps',
		3,
		'Hips high, head between the hands.',
		'Pressure in the head or high blood pressure: press standing instead, and ask your doctor.',
		[
			'Pike press-up, feet on a box: box',
			'Pike press-up, feet on the floor',
			'Pike press-up from the knees'
		]
	),
	movement(
		'Wall walk',
		'vertical push',
		'shoulders trunk',
		8,
		'Small steps, belly tight.',
		'High blood pressure or an eye condition: not upside down; ask your doctor. Come down before you tire.',
		['Wall walk, all the way up', 'Wall walk, half way', 'Inchworm']
	),
	movement(
		'Bent-over row',
		'horizontal pull',
		'back biceps',
		3,
		'Chest long, pull to the pocket.',
		back,
		[
			'Bent-over row, dumbbell pair: db',
			'Bent-over row, one kettlebell: kb',
			'Bent-over row, band: band',
			'Prone row on the floor'
		]
	),
	movement(
		'Bench row',
		'horizontal pull',
		'back biceps',
		3,
		'Shoulder blade first, elbow after.',
		'Stop short of twisting the back.',
		[
			'Bench row, dumbbell pair: bench db',
			'Box row, kettlebell: box kb',
			'Band row in a split stance: band',
			'Prone row on the floor'
		],
		true
	),
	movement(
		'Ring row',
		'horizontal pull',
		'back biceps',
		3,
		'Body straight, ribs to the rings.',
		'Check the straps are level and closed.',
		[
			'Ring row, feet on a box: rings box',
			'Ring row, feet forward: rings',
			'Ring row, upright: rings',
			'Band row, standing: band',
			'Prone row on the floor'
		]
	),
	movement(
		'Band row',
		'horizontal pull',
		'back',
		3,
		'Long neck, slow return.',
		'Anchor the band on something that stays.',
		['Band row, seated: band mat', 'Band row, standing: band', 'Shoulder-blade squeeze, arms wide']
	),
	movement(
		'Face pull',
		'horizontal pull',
		'shoulders back',
		3,
		'Thumbs back, elbows high.',
		`Light enough that nothing pinches. ${sharp}`,
		['Ring face pull: rings', 'Face pull, long band: band', 'Wall angel']
	),
	movement(
		'Renegade row',
		'horizontal pull',
		'back trunk',
		4,
		'Feet wide, hips still.',
		'Hexagonal bells only: round ones roll.',
		[
			'Renegade row, dumbbell pair: db',
			'Renegade row on a bench: bench db',
			'Plank with shoulder taps: mat',
			'Shoulder taps from the knees'
		]
	),
	movement(
		'Pull-up',
		'vertical pull',
		'back biceps',
		3,
		'Shoulder blades down first, chin clears.',
		`Shoulders or elbows sore: take the rows. ${sharp}`,
		[
			'Strict pull-up: bar',
			'Band-assisted pull-up: bar band',
			'Slow lowering from the bar: bar box',
			'Ring row: rings',
			'Band pull-down, kneeling: band',
			'Prone pull on the floor'
		]
	),
	movement(
		'Chin-up',
		'vertical pull',
		'back biceps',
		3,
		'Palms to you, chest tall.',
		`Elbows sore: neutral grip or rows. ${sharp}`,
		[
			'Strict chin-up: bar',
			'Band-assisted chin-up: bar band',
			'Slow lowering, palms to you: bar box',
			'Ring row, palms up: rings',
			'Band pull-down: band',
			'Prone pull on the floor'
		]
	),
	movement(
		'Hang',
		'vertical pull',
		'grip shoulders',
		1,
		'Long arms, active shoulders.',
		'Step down before the grip goes: no dropping off.',
		[
			'Hang from the bar: bar',
			'Hang, feet on a box: bar box',
			'Farmer hold, dumbbell pair: db',
			'Band hold overhead: band',
			'Towel squeeze'
		]
	),
	movement(
		'Band pull-down',
		'vertical pull',
		'back',
		3,
		'Elbows to the ribs.',
		'Anchor the band on something that stays.',
		[
			'Band pull-down, kneeling: band mat',
			'Band pull-down, standing: band',
			'Prone pull on the floor'
		]
	),
	movement(
		'Hanging knee raise',
		'trunk',
		'trunk grip',
		3,
		'No swing: pause at the top.',
		`Back sore: do the lying one. ${pregnant}`,
		['Knee raise from the bar: bar', 'Lying leg lower: mat', 'Dead bug']
	),
	movement(
		'Split squat',
		'lunge',
		'quads glutes',
		4,
		'Straight down, front heel heavy.',
		`Front knee sore: shorter and slower. ${sharp}`,
		[
			'Split squat, back foot on a bench: bench db',
			'Split squat, dumbbell pair: db',
			'Split squat, hand on a box: box',
			'Split squat, hands free'
		],
		true
	),
	movement(
		'Reverse lunge',
		'lunge',
		'quads glutes',
		3,
		'Long step back, tall chest.',
		`Front knee sore: shorter step. Watch who stands behind you. ${sharp}`,
		[
			'Reverse lunge, dumbbell pair: db',
			'Reverse lunge, kettlebell at the chest: kb',
			'Reverse lunge, hands free',
			'Reverse lunge, hand on the wall'
		],
		true
	),
	movement(
		'Walking lunge',
		'lunge',
		'quads glutes',
		3,
		'Knee kisses the floor.',
		`One lane each, all the same way. Knee sore: step and hold. ${sharp}`,
		['Walking lunge, dumbbell pair: db', 'Walking lunge, hands free', 'Step and hold']
	),
	movement(
		'Step-up',
		'lunge',
		'quads glutes',
		3,
		'Whole foot on the box, stand tall.',
		`Check that the box stands firmly. Step down, never jump down. ${sharp}`,
		[
			'Step-up with a dumbbell pair: box db',
			'Step-up on a box: box',
			'March on the spot, knees high'
		],
		true
	),
	movement(
		'Box step-over',
		'lunge',
		'quads glutes',
		4,
		'Over and turn, quiet feet.',
		'Check that the box stands firmly, and look before you turn.',
		[
			'Box step-over with a dumbbell pair: box db',
			'Box step-over: box',
			'Lateral step on the floor'
		]
	),
	movement(
		'Lateral lunge',
		'lunge',
		'adductors glutes',
		3,
		'Hips back, other leg long.',
		sharp,
		[
			'Lateral lunge, kettlebell at the chest: kb',
			'Lateral lunge, hands free',
			'Side step and reach'
		],
		true
	),
	movement(
		'Farmer carry',
		'carry',
		'grip trunk',
		2,
		'Tall and quiet, short steps.',
		'Clear the lane first; set down, do not drop.',
		[
			'Farmer carry, dumbbell pair: db',
			'Farmer carry, two kettlebells: kb*2',
			'Farmer carry, one kettlebell: kb',
			'Band-loaded march: band',
			'Tall march'
		]
	),
	movement(
		'Suitcase carry',
		'carry',
		'trunk grip',
		2,
		'Do not lean to either side.',
		'Clear the lane first.',
		[
			'Suitcase carry, kettlebell: kb',
			'Suitcase carry, one dumbbell of a pair: db',
			'Suitcase carry, band in one hand: band',
			'Single-leg march'
		],
		true
	),
	movement(
		'Front-rack carry',
		'carry',
		'trunk back',
		2,
		'Elbows in, breathe behind the brace.',
		'Wrists sore: hug one bell instead.',
		['Front-rack carry, dumbbell pair: db', 'Kettlebell hug carry: kb']
	),
	movement(
		'Overhead carry',
		'carry',
		'shoulders trunk',
		2,
		'Arm by the ear, ribs down.',
		`Not with a sore shoulder. ${sharp}`,
		[
			'Overhead carry, kettlebell: kb',
			'Overhead carry, one dumbbell of a pair: db',
			'Overhead carry, empty-handed, arms up'
		],
		true
	),
	movement(
		'Plank',
		'trunk',
		'trunk',
		1,
		'Squeeze everything, breathe.',
		`Lower back sags: knees down. ${pregnant}`,
		['Plank, feet on a box: box mat', 'Plank on a mat: mat', 'Plank from the knees']
	),
	movement(
		'Side plank',
		'trunk',
		'trunk',
		1,
		'Hips high, bottom shoulder strong.',
		'Shoulder sore: forearm on a bench or knees down.',
		['Side plank on a mat: mat', 'Side plank from the knees'],
		true
	),
	movement(
		'Hollow hold',
		'trunk',
		'trunk',
		1,
		'Lower back glued down.',
		`Back lifts: bend the knees. ${pregnant}`,
		['Hollow hold, long: mat', 'Hollow hold, tucked', 'Dead bug']
	),
	movement(
		'Dead bug',
		'trunk',
		'trunk',
		4,
		'Slow, opposite arm and leg.',
		'Neck tired: rest the head.',
		['Dead bug with a band: band mat', 'Dead bug on a mat: mat', 'Heel taps'],
		true
	),
	movement(
		'Pallof press',
		'trunk',
		'trunk',
		4,
		'Do not let it turn you.',
		'Anchor the band on something that stays.',
		['Pallof press, long band: band', 'Half-kneeling hold, partner’s hand'],
		true
	),
	movement(
		'Get-up, half',
		'trunk',
		'trunk shoulders',
		8,
		'Eyes on the bell, roll to the elbow.',
		`Light until it is smooth; arm locked. ${sharp}`,
		[
			'Half get-up, kettlebell: kb mat',
			'Half get-up, one dumbbell of a pair: db mat',
			'Half get-up, fist to the sky'
		],
		true
	),
	movement(
		'Row, machine',
		'conditioning',
		'quads hamstrings back',
		2,
		'Legs, body, arms; and back again.',
		doctor,
		['Rower: rower', 'Air bike: bike', 'Fast step-ups: box', 'High-knee run']
	),
	movement(
		'Air bike',
		'conditioning',
		'quads shoulders',
		1,
		'Drive with legs and arms together.',
		doctor,
		['Air bike: bike', 'Rower: rower', 'Skipping: rope', 'Fast feet']
	),
	movement(
		'Skipping',
		'conditioning',
		'calves',
		1,
		'Small jumps, wrists turn.',
		`Calf or Achilles sore: step side to side. ${doctor}`,
		[
			'Skipping, double turns: rope',
			'Skipping, single turns: rope',
			'Jump without a rope',
			'Step side to side'
		]
	),
	movement(
		'Shuttle run',
		'conditioning',
		'calves hamstrings',
		1,
		'Low at the turn.',
		`Shoes tied, lane clear; walk it if a joint complains. ${doctor}`,
		['Shuttle run', 'Shuttle walk, fast']
	),
	movement(
		'Burpee',
		'conditioning',
		'chest quads',
		3,
		'Step or jump, one rhythm.',
		`${doctor} Wrists or back sore: hands on a box.`,
		[
			'Burpee with a jump',
			'Burpee, step back and up',
			'Burpee, hands on a box: box',
			'Squat and reach'
		]
	),
	movement(
		'Mountain climber',
		'conditioning',
		'trunk quads',
		1,
		'Hips level, quick feet.',
		'Wrists sore: hands on a bench.',
		['Mountain climber', 'Mountain climber, hands on a bench: bench', 'Standing knee drive']
	),
	movement(
		'Bear crawl',
		'conditioning',
		'shoulders trunk',
		1,
		'Knees a hand’s width off the floor.',
		'Wrists sore: walk instead. Look where you crawl.',
		['Bear crawl', 'Hold on all fours']
	),
	movement(
		'Thruster',
		'conditioning',
		'quads shoulders',
		3,
		'One breath a rep, elbows up.',
		`${doctor} Overhead sore: stop at the shoulders.`,
		[
			'Thruster, dumbbell pair: db',
			'Thruster, kettlebell: kb',
			'Thruster, band: band',
			'Air squat and reach'
		]
	),
	movement(
		'Band opener',
		'mobility',
		'shoulders',
		3,
		'Wide grip, slow circle.',
		'No force: widen the grip.',
		['Band opener, long band: band', 'Band opener, arms alone']
	),
	movement(
		'Hip opener',
		'mobility',
		'glutes adductors',
		4,
		'Lunge, turn, reach.',
		'A mat under the knee.',
		['Hip opener on a mat: mat', 'Hip opener, standing'],
		true
	),
	movement(
		'Ankle and calf',
		'mobility',
		'calves',
		3,
		'Knee over the toes, heel down.',
		sharp,
		['Calf stretch on a box, two to a box: box/2', 'Calf stretch at the wall'],
		true
	)
];

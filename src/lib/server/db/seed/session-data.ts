import {
	coolDown,
	everyMinute,
	p,
	stations,
	straight,
	superset,
	timed,
	warmUp,
	type SessionDraft
} from './session-builder';

const tired = { belowReps: 5, to: 'next-regression' as const, note: 'Quality before numbers.' };
const openAndSkip = [
	p('Band opener', { reps: 10 }),
	p('Skipping', { variation: 'Skipping, single turns' })
];
const breathe = [
	p('Hip opener', { variation: 'Hip opener, standing' }),
	p('Ankle and calf', { variation: 'Calf stretch at the wall' })
];

const strength: SessionDraft[] = [
	{
		title: 'Pull day, light bells',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'Own the top of the pull-up; squat with the trunk tall.',
		blocks: [
			warmUp(8, ...openAndSkip),
			stations(
				'opener',
				'Row, carry, jump',
				[2, 40, 20, 30],
				p('Row, machine'),
				p('Farmer carry'),
				p('Squat jump')
			),
			superset(
				'Pull and squat',
				4,
				[
					p('Pull-up', {
						reps: 5,
						tempo: '31X1',
						restS: 75,
						drop: tired,
						note: 'Chin over, then two quiet seconds of nothing.'
					}),
					p('Goblet squat', {
						variation: 'Goblet squat, one dumbbell of a pair',
						reps: 10,
						tempo: '2011',
						restS: 60,
						kg: [10, 20]
					}),
					p('Plank', { variation: 'Plank from the knees', seconds: 40, restS: 20 })
				],
				{ rotation: 'split' }
			),
			stations(
				'circuit',
				'Four stations',
				[3, 45, 15, 60],
				p('Swing'),
				p('Box step-over', { variation: 'Box step-over' }),
				p('Band row', { variation: 'Band row, standing' }),
				p('Skipping')
			),
			timed('finisher', 'Hollow and climb', 'as-many-rounds', 5, [
				p('Hollow hold', { variation: 'Hollow hold, tucked', seconds: 20 }),
				p('Mountain climber', { reps: 30 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Tempo squat & row',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'Slow legs, strong back.',
		blocks: [
			warmUp(10, p('Hip opener'), p('Band opener')),
			superset('Squat and row', 5, [
				p('Front squat, dumbbells', { reps: 6, tempo: '40X1', restS: 75, kg: [10, 20] }),
				p('Bent-over row', { reps: 8, tempo: '20X1', restS: 75, kg: [10, 20] })
			]),
			superset('One side at a time', 3, [
				p('Split squat', {
					variation: 'Split squat, hands free',
					reps: 8,
					tempo: '3010',
					restS: 30
				}),
				p('Plank', { variation: 'Plank from the knees', seconds: 40, restS: 45 })
			]),
			timed('finisher', 'Legs to empty', 'for-time', 6, [
				p('Walking lunge', { variation: 'Walking lunge, hands free', reps: 40 }),
				p('Burpee', { variation: 'Burpee, step back and up', reps: 20 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Push day, slow lowers',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'Control on the way down; nothing ugly on the way up.',
		blocks: [
			warmUp(8, ...openAndSkip),
			straight(
				'strength',
				'Press',
				p('Shoulder press', { sets: 4, reps: 6, tempo: '30X1', restS: 90, kg: [7.5, 17.5] })
			),
			superset(
				'Push and pull apart',
				4,
				[
					p('Press-up', {
						variation: 'Full press-up',
						expectedReps: 10,
						tempo: '4010',
						restS: 45,
						drop: {
							belowReps: 6,
							to: 'Press-up, hands on a bench',
							note: 'Higher hands, same slow lowering.'
						}
					}),
					p('Face pull', { variation: 'Face pull, long band', reps: 12, tempo: '2011', restS: 60 })
				],
				{ rotation: 'split' }
			),
			stations(
				'circuit',
				'Carry and brace',
				[3, 40, 20, 45],
				p('Farmer carry'),
				p('Side plank', { variation: 'Side plank from the knees' }),
				p('Mountain climber')
			),
			timed('finisher', 'Press-up ladder', 'as-many-rounds', 4, [
				p('Press-up', {
					variation: 'Full press-up',
					reps: 8,
					note: 'Two more each round for as long as they are clean.'
				})
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Hinge & carry',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'Hips that work, grip that stays.',
		blocks: [
			warmUp(8, p('Hip opener'), p('Band opener')),
			superset(
				'Hinge',
				5,
				[
					p('Romanian deadlift', { reps: 8, tempo: '31X1', restS: 60, kg: [15, 30] }),
					p('Dead bug', { variation: 'Heel taps', reps: 6, restS: 45 })
				],
				{ rotation: 'split' }
			),
			stations(
				'strength',
				'Carries',
				[4, 40, 20, 60],
				p('Farmer carry'),
				p('Suitcase carry'),
				p('Single-leg bridge', { variation: 'Single-leg bridge on the floor' })
			),
			everyMinute(
				'conditioning',
				'Swing on the minute',
				8,
				[p('Swing', { reps: 15 }), p('Squat jump', { reps: 8 })],
				{ rotation: 'split' }
			),
			timed('finisher', 'Hang, in three waves', 'as-many-rounds', 1, [p('Hang', { seconds: 25 })], {
				waves: 3,
				note: 'One wave hangs; the other two count and breathe.'
			}),
			coolDown(...breathe)
		]
	},
	{
		title: 'Bells in pairs',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'Two bells, even shoulders.',
		blocks: [
			warmUp(11, p('Band opener'), p('Hip opener')),
			superset('Press and squat', 5, [
				p('Push press', { reps: 5, restS: 75, kg: [10, 20] }),
				p('Front squat, dumbbells', { reps: 6, tempo: '30X1', restS: 75, kg: [10, 20] })
			]),
			superset(
				'Row and bridge',
				4,
				[
					p('Bench row', { variation: 'Band row in a split stance', reps: 8, restS: 30 }),
					p('Single-leg bridge', {
						variation: 'Single-leg bridge on the floor',
						reps: 8,
						restS: 45
					})
				],
				{ rotation: 'split' }
			),
			timed(
				'finisher',
				'Thrusters, steady',
				'for-time',
				5,
				[p('Thruster', { reps: 50, kg: [5, 15] })],
				{ note: 'Fifty, in sets that you would finish.' }
			),
			coolDown(...breathe)
		]
	},
	{
		title: 'Rings and legs',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'Pull on what moves; step on what does not.',
		blocks: [
			warmUp(8, ...openAndSkip),
			stations(
				'strength',
				'Three by three',
				[4, 60, 30, 60],
				p('Ring row', { variation: 'Ring row, feet forward' }),
				p('Step-up', { variation: 'Step-up on a box' }),
				p('Floor press', { kg: [10, 25] })
			),
			straight(
				'strength',
				'Legs',
				p('Reverse lunge', { sets: 4, reps: 8, tempo: '20X0', restS: 60, kg: [7.5, 20] })
			),
			timed(
				'circuit',
				'Twice four minutes',
				'timed-circuit',
				4,
				[
					p('Squat jump', { reps: 10 }),
					p('Plank', { variation: 'Plank from the knees', seconds: 30 }),
					p('Bear crawl', { metres: 20, metresPerSecond: 1 })
				],
				{ repeats: 2, betweenS: 90 }
			),
			coolDown(...breathe)
		]
	},
	{
		title: 'Heavy and few',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'Fives that stay fives. Rest is part of it.',
		blocks: [
			warmUp(11, p('Hip opener'), p('Band opener')),
			straight(
				'strength',
				'Split squats',
				p('Split squat', {
					variation: 'Split squat, dumbbell pair',
					sets: 5,
					reps: 5,
					tempo: '31X1',
					restS: 120,
					kg: [12.5, 25]
				})
			),
			superset(
				'Floor press and row',
				5,
				[
					p('Floor press', { reps: 6, tempo: '21X0', restS: 60, kg: [12.5, 27.5] }),
					p('Renegade row', { variation: 'Shoulder taps from the knees', reps: 10, restS: 60 })
				],
				{ rotation: 'split' }
			),
			timed('finisher', 'Wall sit', 'for-time', 4, [
				p('Wall sit', {
					variation: 'Wall sit',
					seconds: 150,
					note: 'Split it as you like; the clock does not stop.'
				})
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Saturday partners',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'You go, I go. Count for each other.',
		blocks: [
			warmUp(
				8,
				p('Shuttle run', { variation: 'Shuttle walk, fast' }),
				p('Hip opener', { variation: 'Hip opener, standing' })
			),
			stations(
				'opener',
				'Wake up',
				[2, 30, 15, 30],
				p('Row, machine'),
				p('Squat jump'),
				p('Bear crawl')
			),
			timed(
				'circuit',
				'You go, I go',
				'as-many-rounds',
				12,
				[
					p('Farmer carry', { metres: 40, metresPerSecond: 1.5 }),
					p('Press-up', { variation: 'Full press-up', reps: 10 }),
					p('Reverse lunge', { variation: 'Reverse lunge, hands free', reps: 8 })
				],
				{ note: 'One works, one counts; change after every movement.' }
			),
			stations(
				'circuit',
				'Four corners',
				[3, 45, 15, 60],
				p('Swing'),
				p('Step-up', { variation: 'Step-up on a box' }),
				p('Skipping'),
				p('Side plank', { variation: 'Side plank from the knees' })
			),
			timed(
				'finisher',
				'Rower relay',
				'for-time',
				2,
				[p('Row, machine', { metres: 350, metresPerSecond: 3.5 })],
				{
					waves: 3,
					note: 'Three waves; those who wait shout.'
				}
			),
			coolDown(...breathe)
		]
	},
	{
		title: 'Row and carry',
		programme: 'Strength',
		lengthMin: 60,
		aim: 'Strong first, then long.',
		blocks: [
			warmUp(8, p('Hip opener'), p('Band opener')),
			superset(
				'Deadlift and press',
				4,
				[
					p('Romanian deadlift', { reps: 6, tempo: '30X1', restS: 75, kg: [15, 30] }),
					p('Press-up', { variation: 'Full press-up', reps: 8, tempo: '3010', restS: 60 })
				],
				{ rotation: 'split' }
			),
			stations(
				'conditioning',
				'Row, carry, step',
				[5, 60, 30, 30],
				p('Row, machine'),
				p('Farmer carry'),
				p('Step-up', { variation: 'Step-up on a box' })
			),
			coolDown(...breathe)
		]
	}
];

const engine: SessionDraft[] = [
	{
		title: 'Long intervals',
		programme: 'Engine',
		lengthMin: 45,
		aim: 'Hard enough to count breaths, easy enough to finish.',
		blocks: [
			warmUp(
				6,
				p('Ankle and calf', { variation: 'Calf stretch at the wall' }),
				p('Hip opener', { variation: 'Hip opener, standing' })
			),
			stations(
				'conditioning',
				'Three minutes each',
				[3, 180, 30, 30],
				p('Row, machine'),
				p('Shuttle run'),
				p('Step-up', { variation: 'Step-up on a box' })
			),
			coolDown(...breathe)
		]
	},
	{
		title: 'Thirty on, thirty off',
		programme: 'Engine',
		lengthMin: 45,
		aim: 'Same pace in the last round as in the first.',
		blocks: [
			warmUp(
				7,
				p('Skipping', { variation: 'Skipping, single turns' }),
				p('Hip opener', { variation: 'Hip opener, standing' })
			),
			stations(
				'conditioning',
				'Six stations',
				[4, 30, 30, 60],
				p('Air bike'),
				p('Squat jump'),
				p('Row, machine'),
				p('Mountain climber'),
				p('Skipping'),
				p('Bear crawl')
			),
			timed('finisher', 'Last word', 'for-time', 4, [
				p('Burpee', { variation: 'Burpee, step back and up', reps: 30 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Every minute, honest',
		programme: 'Engine',
		lengthMin: 45,
		aim: 'Finish by second forty. If not, do fewer.',
		blocks: [
			warmUp(
				7,
				p('Hip opener', { variation: 'Hip opener, standing' }),
				p('Ankle and calf', { variation: 'Calf stretch at the wall' })
			),
			everyMinute(
				'conditioning',
				'Twelve minutes',
				12,
				[
					p('Thruster', { reps: 8, kg: [5, 15] }),
					p('Shuttle run', { metres: 60, metresPerSecond: 3 }),
					p('Burpee', { variation: 'Burpee, step back and up', reps: 8 })
				],
				{ rotation: 'split' }
			),
			everyMinute(
				'conditioning',
				'Every ninety seconds',
				7,
				[
					p('Swing', { variation: 'Quick hip hinge, hands free', reps: 15 }),
					p('Plank', { variation: 'Plank from the knees', seconds: 40 })
				],
				{ intervalS: 90 }
			),
			coolDown(...breathe)
		]
	},
	{
		title: 'Bike, bell, box',
		programme: 'Engine',
		lengthMin: 45,
		aim: 'Three machines of one kind: you.',
		blocks: [
			warmUp(
				7,
				p('Skipping', { variation: 'Skipping, single turns' }),
				p('Hip opener', { variation: 'Hip opener, standing' })
			),
			stations(
				'circuit',
				'Five stations',
				[4, 45, 20, 60],
				p('Air bike'),
				p('Swing'),
				p('Box step-over', { variation: 'Box step-over' }),
				p('Row, machine'),
				p('Farmer carry')
			),
			coolDown(...breathe)
		]
	},
	{
		title: 'Skip and shuttle',
		programme: 'Engine',
		lengthMin: 45,
		aim: 'Light feet.',
		blocks: [
			warmUp(
				7,
				p('Ankle and calf', { variation: 'Calf stretch at the wall' }),
				p('Band opener', { variation: 'Band opener, arms alone' })
			),
			stations(
				'conditioning',
				'Feet',
				[5, 60, 20, 40],
				p('Skipping'),
				p('Shuttle run'),
				p('Squat jump')
			),
			timed('finisher', 'Floor', 'as-many-rounds', 5, [
				p('Mountain climber', { reps: 30 }),
				p('Hollow hold', { variation: 'Hollow hold, tucked', seconds: 20 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Two eights',
		programme: 'Engine',
		lengthMin: 45,
		aim: 'Eight minutes without a stop, a short break, eight more.',
		blocks: [
			warmUp(
				8,
				p('Hip opener', { variation: 'Hip opener, standing' }),
				p('Skipping', { variation: 'Skipping, single turns' })
			),
			timed(
				'circuit',
				'Twice eight minutes',
				'timed-circuit',
				8,
				[
					p('Reverse lunge', { variation: 'Reverse lunge, hands free', reps: 8 }),
					p('Press-up', { variation: 'Full press-up', reps: 10 }),
					p('Row, machine', { calories: 12, caloriesPerMinute: 10 }),
					p('Farmer carry', { metres: 40, metresPerSecond: 1.5 })
				],
				{ repeats: 2, betweenS: 120, rotation: 'split' }
			),
			timed('finisher', 'Carry it home', 'for-time', 4, [
				p('Farmer carry', { metres: 200, metresPerSecond: 1.5 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Saturday engine',
		programme: 'Engine',
		lengthMin: 60,
		aim: 'Long and friendly.',
		blocks: [
			warmUp(
				8,
				p('Shuttle run', { variation: 'Shuttle walk, fast' }),
				p('Hip opener', { variation: 'Hip opener, standing' })
			),
			stations(
				'conditioning',
				'Round the room',
				[4, 75, 20, 60],
				p('Row, machine'),
				p('Step-up', { variation: 'Step-up on a box' }),
				p('Skipping'),
				p('Farmer carry'),
				p('Bear crawl')
			),
			timed('finisher', 'Team count', 'as-many-rounds', 8, [
				p('Squat jump', { reps: 10 }),
				p('Mountain climber', { reps: 20 })
			]),
			coolDown(...breathe)
		]
	}
];

const minimal: SessionDraft[] = [
	{
		title: 'Loft basics',
		programme: 'Minimal kit',
		lengthMin: 45,
		aim: 'The five shapes, well.',
		blocks: [
			warmUp(
				6,
				p('Hip opener', { variation: 'Hip opener, standing' }),
				p('Ankle and calf', { variation: 'Calf stretch at the wall' })
			),
			straight(
				'skill',
				'Squat and hinge',
				p('Goblet squat', { variation: 'Air squat', sets: 3, reps: 10, tempo: '3111', restS: 30 }),
				p('Romanian deadlift', {
					variation: 'Good morning, hands on the hips',
					sets: 3,
					reps: 8,
					tempo: '3111',
					restS: 30
				})
			),
			superset('Push and pull', 4, [
				p('Press-up', {
					variation: 'Press-up, hands on the wall',
					reps: 10,
					tempo: '3010',
					restS: 20
				}),
				p('Ring row', { variation: 'Prone row on the floor', reps: 10, tempo: '2011', restS: 40 })
			]),
			timed('finisher', 'Easy finish', 'as-many-rounds', 5, [
				p('Wall sit', { variation: 'Wall sit, higher', seconds: 30 }),
				p('Dead bug', { variation: 'Heel taps', reps: 6 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Rings in the Loft',
		programme: 'Minimal kit',
		lengthMin: 45,
		aim: 'Rows that count.',
		blocks: [
			warmUp(
				6,
				p('Hip opener', { variation: 'Hip opener, standing' }),
				p('Band opener', { variation: 'Band opener, arms alone' })
			),
			superset(
				'Rows and lunges',
				5,
				[
					p('Ring row', {
						variation: 'Ring row, feet forward',
						reps: 8,
						tempo: '31X1',
						restS: 45,
						drop: tired
					}),
					p('Reverse lunge', {
						variation: 'Reverse lunge, hands free',
						reps: 8,
						tempo: '20X0',
						restS: 45
					})
				],
				{ rotation: 'split' }
			),
			timed('circuit', 'Around the rings', 'timed-circuit', 7, [
				p('Press-up', { variation: 'Full press-up', reps: 8 }),
				p('Hollow hold', { variation: 'Hollow hold, tucked', seconds: 20 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Nothing but floor',
		programme: 'Minimal kit',
		lengthMin: 45,
		aim: 'All of it can be done in a hotel room.',
		blocks: [
			warmUp(
				7,
				p('Hip opener', { variation: 'Hip opener, standing' }),
				p('Ankle and calf', { variation: 'Calf stretch at the wall' })
			),
			straight(
				'strength',
				'Slow legs',
				p('Split squat', {
					variation: 'Split squat, hands free',
					sets: 4,
					reps: 8,
					tempo: '4010',
					restS: 30
				})
			),
			stations(
				'circuit',
				'Floor work',
				[5, 40, 20, 40],
				p('Press-up', { variation: 'Full press-up' }),
				p('Bear crawl'),
				p('Side plank', { variation: 'Side plank from the knees' })
			),
			coolDown(...breathe)
		]
	},
	{
		title: 'Slow lowers, no bar',
		programme: 'Minimal kit',
		lengthMin: 45,
		aim: 'Five seconds down, every time.',
		blocks: [
			warmUp(
				7,
				p('Band opener', { variation: 'Band opener, arms alone' }),
				p('Hip opener', { variation: 'Hip opener, standing' })
			),
			superset('Down slowly', 6, [
				p('Press-up', { variation: 'Full press-up', reps: 6, tempo: '5010', restS: 40 }),
				p('Single-leg deadlift', {
					variation: 'Single-leg deadlift, hand on the wall',
					reps: 6,
					tempo: '5010',
					restS: 40
				})
			]),
			timed('finisher', 'Hold', 'for-time', 4, [
				p('Plank', {
					variation: 'Plank from the knees',
					seconds: 120,
					note: 'Two minutes in as many holds as it takes.'
				})
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Step and brace',
		programme: 'Minimal kit',
		lengthMin: 45,
		aim: 'Balance on one leg, calm in the middle.',
		blocks: [
			warmUp(
				7,
				p('Hip opener', { variation: 'Hip opener, standing' }),
				p('Ankle and calf', { variation: 'Calf stretch at the wall' })
			),
			stations(
				'skill',
				'One leg',
				[3, 60, 20, 40],
				p('Step-up', { variation: 'Step-up on a box' }),
				p('Single-leg deadlift', { variation: 'Single-leg deadlift, hand on the wall' }),
				p('Dead bug', { variation: 'Heel taps' })
			),
			timed('circuit', 'Brace', 'as-many-rounds', 10, [
				p('Mountain climber', { reps: 20 }),
				p('Side plank', { variation: 'Side plank from the knees', seconds: 20 }),
				p('Bear crawl', { metres: 10, metresPerSecond: 1 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Hips and shoulders',
		programme: 'Minimal kit',
		lengthMin: 45,
		aim: 'Leave looser than you came.',
		blocks: [
			warmUp(
				7,
				p('Band opener', { variation: 'Band opener, arms alone' }),
				p('Hip opener', { variation: 'Hip opener, standing' })
			),
			straight(
				'skill',
				'Range',
				p('Cossack squat', {
					variation: 'Cossack squat',
					sets: 4,
					reps: 6,
					tempo: '3110',
					restS: 30
				}),
				p('Pike press-up', {
					variation: 'Pike press-up from the knees',
					sets: 4,
					reps: 8,
					tempo: '3010',
					restS: 45
				})
			),
			timed('circuit', 'Easy flow', 'timed-circuit', 12, [
				p('Lateral lunge', { variation: 'Lateral lunge, hands free', reps: 6 }),
				p('Dead bug', { variation: 'Heel taps', reps: 6 })
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Deload floor',
		programme: 'Minimal kit',
		lengthMin: 45,
		aim: 'An easy week is work too.',
		blocks: [
			warmUp(
				8,
				p('Hip opener', { variation: 'Hip opener, standing' }),
				p('Band opener', { variation: 'Band opener, arms alone' })
			),
			{
				kind: 'strength',
				title: 'Rounds, easy',
				format: 'rounds',
				rounds: 5,
				setUpS: 30,
				prescriptions: [
					p('Goblet squat', { variation: 'Air squat', reps: 8, tempo: '2010', restS: 20 }),
					p('Press-up', {
						variation: 'Press-up, hands on the wall',
						reps: 8,
						tempo: '2010',
						restS: 20
					}),
					p('Dead bug', { variation: 'Heel taps', reps: 6, restS: 60 })
				]
			},
			timed('conditioning', 'Walk and breathe', 'timed-circuit', 8, [
				p('Shuttle run', {
					variation: 'Shuttle walk, fast',
					metres: 400,
					metresPerSecond: 1.4,
					note: 'Breathe through the nose.'
				})
			]),
			coolDown(...breathe)
		]
	},
	{
		title: 'Bands everywhere',
		programme: 'Minimal kit',
		lengthMin: 45,
		aim: 'Tension from the first centimetre.',
		blocks: [
			warmUp(
				7,
				p('Hip opener', { variation: 'Hip opener, standing' }),
				p('Ankle and calf', { variation: 'Calf stretch at the wall' })
			),
			superset(
				'Band press and row',
				5,
				[
					p('Band chest press', { reps: 10, tempo: '2011', restS: 30 }),
					p('Bent-over row', {
						variation: 'Bent-over row, band',
						reps: 10,
						tempo: '2011',
						restS: 45
					})
				],
				{ rotation: 'split' }
			),
			stations(
				'circuit',
				'Floor between',
				[3, 45, 15, 45],
				p('Walking lunge', { variation: 'Walking lunge, hands free' }),
				p('Mountain climber'),
				p('Hollow hold', { variation: 'Hollow hold, tucked' })
			),
			coolDown(...breathe)
		]
	}
];

export const sessionData: SessionDraft[] = [...strength, ...engine, ...minimal];

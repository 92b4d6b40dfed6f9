export { allocate, type Allocation, type Choices } from './allocation';
export { places, type Places, type PlacesAsk, type LimitedBy } from './places';
export type {
	KitItem,
	Need,
	Problem,
	ProblemBlock,
	ProblemPerson,
	ProblemSlot,
	Shortage,
	Station,
	Variation
} from './problem';
export { refusals, type PlanRefusal } from './refusals';
export { shortages } from './shortages';
export { serveNewcomer, type NewcomerAnswer } from './newcomer';

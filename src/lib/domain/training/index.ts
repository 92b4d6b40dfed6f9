export { minutesOver, sessionLength, workSeconds } from './length';
export type { Format, SessionLength, Span, TimedBlock, Work } from './length';
export { parseTempo, repSeconds, setSeconds, tempoSaid } from './tempo';
export type { Tempo, TempoPart } from './tempo';
export { blockKinds, mostBlocks, mostPrescriptions, readSession, sessionContent } from './session';
export type {
	Block,
	BlockKind,
	DropRule,
	LoadRule,
	Prescription,
	SessionContent,
	SessionFault
} from './session';
export { sessionFaults, type SessionFaultCode } from './session-faults';
export { effortOf, sessionPlan } from './plan';
export type { PlannedBlock, RepDefaults, SessionPlan } from './plan';
export { secondsPerRep, stationsOf } from './stations';
export type { MovementLibrary, Need, Rung, Station, StationBlock } from './stations';
export { checkChoices, claimantOf, keepChoices, writtenRange } from './choices';
export type { Choices, Claimant } from './choices';
export { dropSaid, type DropSaid } from './drop';

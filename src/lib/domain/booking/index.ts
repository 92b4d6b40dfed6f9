export { bookingWindow, cancelKind, cutOffAt } from './window';
export { mayBook, overlapping } from './may-book';
export type { MayNotBook, WhoMayBook } from './may-book';
export { coveringPass, isInDate } from './passes';
export type { HeldPass } from './passes';
export { inLine, nextToServe, positionOf, waitlistMode } from './waitlist';
export type { Waiting } from './waitlist';

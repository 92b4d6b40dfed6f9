export { bookingWindow, cancelKind, cutOffAt } from './window';
export { mayBook, overlapping } from './may-book';
export type { MayNotBook, WhoMayBook } from './may-book';
export { coveringPass, isInDate } from './passes';
export type { HeldPass } from './passes';

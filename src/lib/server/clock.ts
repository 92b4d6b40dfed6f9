/** The one clock of the server, in epoch milliseconds. Rules and commands get it as an argument. */
export const now = (): number => Date.now();

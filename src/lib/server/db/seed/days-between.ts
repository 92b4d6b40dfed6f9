/** Days from one civil date to another; below zero where the other is earlier. */
export const daysBetween = (fromOn: string, toOn: string): number =>
	Math.round((Date.parse(toOn) - Date.parse(fromOn)) / 86_400_000);

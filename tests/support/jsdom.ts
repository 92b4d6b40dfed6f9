/** jsdom has no layout, so nothing ever resizes in it. */
class NoResizes implements ResizeObserver {
	observe(): void {}
	unobserve(): void {}
	disconnect(): void {}
}

globalThis.ResizeObserver ??= NoResizes;

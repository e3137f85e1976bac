/** Resolves when the browser has painted; a hidden page does not paint, so its receiver waits. */
export const nextPaint = () => new Promise<void>((resolve) => requestAnimationFrame(() => resolve()));
/** Resolves after so many milliseconds. */
export const pause = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));

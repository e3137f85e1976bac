/**
 * A name that a method may use beside the exercise's own: what this attempt's receiver displays for each true hertz, so that a
 * marker stands where a needle is shown, as it does for whoever looks at the screen.
 */
export const DISPLAYED_PER_HZ = 'displayedPerHz';

/**
 * A name that a method’s sums may use beside the exercise’s own: the resolution bandwidth, Hz, that the latest reading was
 * swept with, so that whoever takes another filter reckons with that one.
 */
export const SWEPT_RBW_HZ = 'sweptRbwHz';

/** An e-mail address as it is kept and compared: without outer spaces, composed, in lower case. */
export const normaliseEmail = (typed: string): string => typed.trim().normalize('NFC').toLowerCase();

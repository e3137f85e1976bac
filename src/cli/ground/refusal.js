/** What a command can't do and what to do about it, in words for the person at the terminal: shown without a stack. */
export class Refusal extends Error {}

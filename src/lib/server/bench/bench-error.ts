/**
 * A refusal by name: what was asked for can't be done, `field` says which entry is at fault (as typed, dotted when nested)
 * and the message says the limit and the value given. Nothing on the bench is ever clamped instead.
 */
export class BenchError extends Error {
	readonly field: string;

	constructor(field: string, message: string) {
		super(message);
		this.name = 'BenchError';
		this.field = field;
	}
}

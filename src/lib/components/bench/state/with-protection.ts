import type { ReceiverFlag } from '$lib/schemas/sweep-stream';

/** The protection stays open until it is reset, whatever the set-up. */
export const withProtection = (flags: readonly ReceiverFlag[]): readonly ReceiverFlag[] =>
	flags.some(({ kind }) => kind === 'input-protection') ? flags : [...flags, { kind: 'input-protection' }];

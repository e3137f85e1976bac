import type { Emitter, EmitterOf } from '$lib/schemas/scene';
import type { EmitterKind } from './emitter-kind';
import { am } from './kinds/am';
import { cw } from './kinds/cw';
import { dc } from './kinds/dc';
import { digital } from './kinds/digital';
import { fm } from './kinds/fm';
import { msk } from './kinds/msk';
import { multicarrier } from './kinds/multicarrier';
import { noise } from './kinds/noise';
import { pm } from './kinds/pm';
import { pulsed } from './kinds/pulsed';

/** Every kind of emitter there is. A new kind is a file in `kinds/` and a line here. */
const kinds: { [K in Emitter['kind']]: EmitterKind<EmitterOf<K>> } = {
	cw,
	am,
	fm,
	pm,
	digital,
	msk,
	multicarrier,
	noise,
	pulsed,
	dc
};

/** What an emitter of this kind can say of itself. */
export const kindOf = <E extends Emitter>(emitter: E): EmitterKind<E> =>
	kinds[emitter.kind] as unknown as EmitterKind<E>;

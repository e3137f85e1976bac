import type { Scene } from '$lib/schemas/scene';
import { dbToPowerRatio } from '$lib/units/decibel';
import { tableDb } from '../table-db';
import type { FrontEndSettings } from './front-end-settings';

/** Power gain, linear, against frequency. */
export interface Connection {
	/** Whether it is the same everywhere. */
	isFlat: boolean;
	at(frequencyHz: number): number;
}

/**
 * Power gain, linear, from the reference plane to the connector against frequency: the scene's path and the pad.
 * The pad is part of what is connected: what it takes off is put back on the screen only by a stated correction.
 */
export function connectionGain(scene: Scene, settings: FrontEndSettings): Connection {
	const { padDb } = settings.input;
	const path = scene.path?.map(({ frequencyHz, lossDb }) => ({ frequencyHz, db: lossDb }));
	if (!path || path.length === 1) {
		const gain = dbToPowerRatio(-padDb - (path ? path[0].db : 0));
		return { isFlat: true, at: () => gain };
	}
	return { isFlat: false, at: (frequencyHz) => dbToPowerRatio(-padDb - tableDb(path, frequencyHz)) };
}

import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { padIn, padOf } from '../pad-of';
import { withLoss } from '../spoil';

/** A pad put before the receiver and then forgotten: the receiver can't know of it. */
export const padLeftOut = defineMistake('pad-left-out', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'pad left out',
	phrase: 'left your pad out',
	change: (_, setUp) => (padOf(setUp) > 0 ? -padOf(setUp) : null),
	explain({ question, setUp, yours }) {
		const padDb = padOf(setUp);
		return {
			title: 'The receiver doesn’t know of your pad',
			text: `You put ${padDb} dB before the connector, and that was right. But a pad outside is not the attenuator inside: the receiver adds its own attenuation back by itself, and yours only when Correction holds it.`,
			sum: `${figure(yours, question.digits)} + ${padDb} = ${figure(yours + padDb, question.digits)} ${question.unit}`,
			part: `your ${padDb} dB pad, not added back`,
			bad: { at: 'answer', text: `Here: the answer is without the pad’s ${padDb} dB` }
		};
	},
	make: (steps, context) => withLoss(steps, context.question.id, -padIn(steps, context))
}));

import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { padOf } from '../pad-of';
import { setUpOf } from '../set-up-of';
import { withLoss } from '../spoil';

const lostDb = ({ question }: Context, setUp: SetUp | undefined): number => question.leadDb + padOf(setUp);

/** The level at the receiver's connector reported as it is: nothing of what was lost on the way added back. */
export const pathLeftOut = defineMistake('path-left-out', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'as it arrives',
	phrase: 'reported the level at the receiver',
	change: (context, setUp) => -lostDb(context, setUp),
	explain({ question, drawn, setUp, yours }) {
		const lost = lostDb({ question, drawn }, setUp);
		const pad = padOf(setUp) > 0 ? `, ${padOf(setUp)} dB of them in your pad` : '';
		return {
			title: 'What arrives is not what was sent',
			text: `Your number is the level at the receiver’s connector. Between ${drawn.brief.plane} and the connector ${shortFigure(lost, 2)} dB are lost${pad}, and none of it was added back.`,
			sum: `${figure(yours, question.digits)} + ${shortFigure(lost, 2)} = ${figure(yours + lost, question.digits)} ${question.unit}`,
			part: 'all that is lost on the way, not added back',
			bad: { at: 'answer', text: 'Here: the answer is the level at the connector' }
		};
	},
	make: (steps, context) =>
		withLoss(steps, context.question.id, -lostDb(context, setUpOf(context.drawn, steps, context.question.id)))
}));

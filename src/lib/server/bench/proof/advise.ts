/** What to do about an exercise that isn't proven, in plain words. */
import type { ProofAdvice, ProofQuestion, ProofRow } from '$lib/schemas/proof-view';
import { SPREADS_APART } from '../grading/mistakes-apart';
import { LIMITS, type ProofTable } from './proof-table';

/** A mistake that passes this seldom is stopped with something in hand, as a share. */
const STOPPED = 0.005;
const percent = (share: number): string => `${(100 * share).toFixed(1)} %`;
const sentence = (text: string): string => text[0].toUpperCase() + text.slice(1);

const sizesOf = ({ errors }: ProofRow): number[] =>
	errors.flatMap((error) => (error === null ? [] : [Math.abs(error)])).sort((a, b) => a - b);

/** A distance between answers in words: two figures of it are enough; of levels it is in dB. */
const quantityIn = (unit: string) => (value: number) =>
	`${Number(value.toPrecision(2))} ${unit.startsWith('dBm') ? 'dB' : unit}`;

/** A tolerance with two figures, not less than asked, or not more. */
function rounded(value: number, towards: 'up' | 'down'): number {
	if (!(value > 0)) return 0;
	const step = 10 ** (Math.floor(Math.log10(value)) - 1);
	const steps = value / step;
	return Number(
		(step * (towards === 'up' ? Math.ceil(steps - 1e-9) : Math.floor(steps + 1e-9))).toPrecision(6)
	);
}

/** The least tolerance with which the taught method passes often enough. */
export function leastTolerance(taught: ProofRow): number {
	const sizes = sizesOf(taught);
	const at = Math.ceil(LIMITS.taughtPasses * taught.errors.length) - 1;
	return at < sizes.length ? rounded(sizes[at], 'up') : Infinity;
}

/** The greatest tolerance with which a mistake passes hardly ever. */
export function greatestTolerance(mistake: ProofRow): number {
	const sizes = sizesOf(mistake);
	const at = Math.floor(STOPPED * mistake.errors.length);
	return at < sizes.length ? rounded(sizes[at] * (1 - 1e-6), 'down') : Infinity;
}

/** @param table the same proof's, for what is said of the exercise as a whole */
export function adviseOn(
	questions: readonly ProofQuestion[],
	rows: readonly ProofRow[],
	table: Pick<ProofTable, 'apartShare' | 'failures'>
): ProofAdvice[] {
	const advice = questions.flatMap((question) => {
		const own = rows.filter((row) => row.question === question.id);
		const taught = own.find(({ mistake }) => mistake === null);
		if (!taught) return [];
		if (question.type !== 'number') return own.flatMap((row) => ofNoNumber(question, row));
		const mistakes = own.filter(({ mistake }) => mistake !== null);
		return [...ofTaught(question, taught), ...mistakes.flatMap((row) => ofMistake(question, taught, row))];
	});
	if (table.apartShare < LIMITS.made) {
		const says = `Two mistakes watched give numbers nearer than ${SPREADS_APART} spreads to each other on ${percent(1 - table.apartShare)} of the seeds, so that a finding can’t tell them apart. Draw values that part them, or watch only one of the two.`;
		advice.push({ question: null, says, tolerance: null });
	}
	for (const failure of table.failures.filter((text) => text.includes('the receiver’s own error')))
		advice.push({ question: null, says: `${sentence(failure)}.`, tolerance: null });
	return advice;
}

/** What is right or wrong has no tolerance to widen: it is answered by the wrong reasoning, or watched where it isn't wrong. */
const ofNoNumber = ({ id }: ProofQuestion, { mistake, label, failures }: ProofRow): ProofAdvice[] =>
	failures.map((failure) => ({
		question: id,
		says:
			mistake === null
				? `The taught method ${failure}: open a seed on which it is wrong and follow it.`
				: `“${sentence(label)}” ${failure}: what it changes doesn’t make the answer wrong there, or breaks more than it says.`,
		tolerance: null
	}));

function ofTaught(question: ProofQuestion, row: ProofRow): ProofAdvice[] {
	const { id, unit, tolerance, absolute } = question;
	const quantity = quantityIn(unit);
	const advice: ProofAdvice[] = [];
	const undone = row.errors.filter((error) => error === null).length;
	if (undone > 0) {
		const says = `The taught method can’t be done on ${undone} of ${row.errors.length} seeds: a step is refused there, or reads no number. Open one of them and follow it.`;
		advice.push({ question: id, says, tolerance: null });
	} else if (row.passShare < row.limit) {
		const least = leastTolerance(row);
		const says = `The tolerance of ±${quantity(tolerance)} is narrower than what the taught method’s own answers scatter by, ${quantity(row.scatter)}: average longer, or allow ±${quantity(least)}.`;
		advice.push({ question: id, says, tolerance: absolute && Number.isFinite(least) ? least : null });
	}
	for (const failure of row.failures.filter((text) => text.startsWith('is off by')))
		advice.push({
			question: id,
			says: `The taught method ${failure}: a step of it leaves something out, such as the lead, the filter’s noise bandwidth or noise not taken off.`,
			tolerance: null
		});
	return advice;
}

function ofMistake(question: ProofQuestion, taught: ProofRow, row: ProofRow): ProofAdvice[] {
	const { id, unit, tolerance, absolute } = question;
	const quantity = quantityIn(unit);
	const who = `“${sentence(row.label)}”`;
	const advice: ProofAdvice[] = [];
	if (row.passShare > row.limit) {
		const greatest = greatestTolerance(row);
		const holds = absolute && greatest > 0 && greatest >= leastTolerance(taught);
		const landing = `${who} lands inside ±${quantity(tolerance)} on ${percent(row.passShare)} of the seeds.`;
		const says = holds
			? `${landing} At ±${quantity(greatest)} it would on ${percent(STOPPED)} at most, and the taught method would still pass.`
			: `${landing} No tolerance stops it and lets the taught method through: draw values that make more of the mistake, or don’t watch it here.`;
		advice.push({ question: id, says, tolerance: holds ? greatest : null });
	}
	for (const failure of row.failures) {
		if (failure.startsWith('could be made'))
			advice.push({ question: id, says: `${who} ${failure}.`, tolerance: null });
		if (failure.startsWith('is named')) {
			const says = `${who} ${failure}: another reason gives the same number there. Draw values that part the two.`;
			advice.push({ question: id, says, tolerance: null });
		}
	}
	return advice;
}

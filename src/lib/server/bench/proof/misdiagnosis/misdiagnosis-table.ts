import type { MadeAnswer } from './made-answer';

/** Shares that a diagnosis must keep to. */
export const LIMITS = {
	/** Of the wrong answers, the mistake named is the one made at least this often. */
	named: 0.95,
	/** Of the right ones, marked wrong at most this often. */
	rightMarkedWrong: 0.01
};

export interface MisdiagnosisRow {
	question: string;
	/** Null for answers without a mistake. */
	mistake: string | null;
	made: number;
	/** Mistakes that happened to give a right number: nothing to be named. */
	harmless: number;
	/** Of the wrong answers, the mistake made is the one named; of those without a mistake, marked right. */
	rightShare: number;
	/** What was said instead, the commonest first: "lead-left-out 3". */
	instead: string;
	notMade: number;
	problem?: string;
}

export interface MisdiagnosisTable {
	exercise: string;
	rows: MisdiagnosisRow[];
	wrongAnswers: number;
	namedShare: number;
	rightAnswers: number;
	rightMarkedWrong: number;
	failures: string[];
	passed: boolean;
}

const isNamed = ({ mistake, found }: MadeAnswer): boolean => found.length === 1 && found[0] === mistake;
const isWrong = ({ verdict }: MadeAnswer): boolean => verdict === 'wrong';

function rowOf(answers: readonly MadeAnswer[]): MisdiagnosisRow {
	const [{ question, mistake }] = answers;
	const made = answers.filter(({ verdict }) => verdict !== null);
	const counted = mistake === null ? made : made.filter(isWrong);
	const isRight = mistake === null ? (one: MadeAnswer) => !isWrong(one) : isNamed;
	const others = new Map<string, number>();
	for (const one of counted.filter((answer) => !isRight(answer))) {
		const said = `${one.found.join(' + ') || 'nothing'} (${one.evidence})`;
		others.set(said, (others.get(said) ?? 0) + 1);
	}
	const instead = [...others].sort((a, b) => b[1] - a[1]).map(([said, times]) => `${said} ${times}`);
	return {
		question,
		mistake,
		made: made.length,
		harmless: made.length - counted.length,
		rightShare: counted.filter(isRight).length / Math.max(1, counted.length),
		instead: instead.slice(0, 3).join(', '),
		notMade: answers.length - made.length,
		problem: answers.find(({ problem }) => problem)?.problem
	};
}

const percent = (share: number): string => `${(100 * share).toFixed(1)} %`;

/** What all answers together say of an exercise's diagnosis. */
export function misdiagnosisTable(exercise: string, answers: readonly MadeAnswer[]): MisdiagnosisTable {
	const groups = new Map<string, MadeAnswer[]>();
	for (const answer of answers) {
		const key = `${answer.question}|${answer.mistake ?? ''}`;
		const group = groups.get(key) ?? [];
		group.push(answer);
		groups.set(key, group);
	}
	const made = answers.filter(({ verdict }) => verdict !== null);
	const wrong = made.filter((answer) => answer.mistake !== null && isWrong(answer));
	const right = made.filter(({ mistake }) => mistake === null);
	const namedShare = wrong.filter(isNamed).length / Math.max(1, wrong.length);
	const rightMarkedWrong = right.filter(isWrong).length / Math.max(1, right.length);
	const failures: string[] = [];
	if (wrong.length === 0) failures.push('no wrong answer could be made');
	else if (namedShare < LIMITS.named)
		failures.push(
			`the mistake made is named in ${percent(namedShare)}, at least ${percent(LIMITS.named)} asked`
		);
	if (rightMarkedWrong > LIMITS.rightMarkedWrong)
		failures.push(
			`right answers are marked wrong in ${percent(rightMarkedWrong)}, at most ${percent(LIMITS.rightMarkedWrong)} allowed`
		);
	return {
		exercise,
		rows: [...groups.values()].map(rowOf).sort((a, b) => a.question.localeCompare(b.question)),
		wrongAnswers: wrong.length,
		namedShare,
		rightAnswers: right.length,
		rightMarkedWrong,
		failures,
		passed: failures.length === 0
	};
}

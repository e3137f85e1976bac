import { SPREADS_APART } from '../grading/mistakes-apart';
import { brief } from './brief';
import type { Outcome } from './outcome';
import type { SeedProof } from './prove-seed';

/** Shares that a proof asks for. */
export const LIMITS = {
	/** The taught method passes at least this often. */
	taughtPasses: 0.99,
	/** A mistake passes at most this often. */
	mistakePasses: 0.05,
	/** The mistake named is the one made at least this often. */
	named: 0.95,
	/** Mistakes are made, and stand apart, at least this often. */
	made: 0.99
};
/** Bias allowed to the taught method: a tenth of its tolerance, beyond what chance explains at four standard errors. */
const BIAS_SHARE = 0.1;
const STANDARD_ERRORS = 4;
/** With fewer seeds than this, nothing is said of bias. */
const BIAS_SEEDS = 8;

export interface ProofRow {
	question: string;
	/** Null for the taught method. */
	mistake: string | null;
	/** Seeds on which it could be done. */
	done: number;
	/** Of them, those that gave a number: only they have errors. */
	numbers: number;
	passShare: number;
	/** Named as the mistake made; for the taught method, found faultless. */
	namedShare: number;
	meanError: number;
	/** Mean of what of the error is not the receiver's own. */
	bias: number;
	/** Standard deviation of the error over the seeds. */
	scatter: number;
	/** Greatest distance from the truth, for the taught method; least, for a mistake. */
	edgeError: number;
	failures: string[];
}

export interface ProofTable {
	exercise: string;
	fromSeed: number;
	seeds: number;
	redraws: number;
	rows: ProofRow[];
	/** Share of seeds on which all mistakes' outcomes were at least four spreads apart. */
	apartShare: number;
	failures: string[];
	passed: boolean;
}

const percent = (share: number): string => `${(100 * share).toFixed(1)} %`;

const mean = (values: readonly number[]): number =>
	values.reduce((sum, value) => sum + value, 0) / Math.max(1, values.length);
function deviation(values: readonly number[]): number {
	const middle = mean(values);
	return Math.sqrt(
		values.reduce((sum, value) => sum + (value - middle) ** 2, 0) / Math.max(1, values.length - 1)
	);
}

function rowOf(outcomes: readonly Outcome[], tolerance: number): ProofRow {
	const [{ question, mistake }] = outcomes;
	const errors = outcomes.flatMap(({ error }) => (error === null ? [] : [error]));
	const biases = outcomes.filter(({ error }) => error !== null).map(({ bias }) => bias);
	const share = (is: (outcome: Outcome) => boolean) => outcomes.filter(is).length / outcomes.length;
	const sizes = errors.map(Math.abs);
	const row: ProofRow = {
		question,
		mistake,
		done: outcomes.filter(({ problem }) => problem === undefined).length,
		numbers: errors.length,
		passShare: share(({ passes }) => passes),
		namedShare: share(({ named }) => named),
		meanError: mean(errors),
		bias: mean(biases),
		scatter: deviation(errors),
		edgeError: sizes.length === 0 ? 0 : mistake === null ? Math.max(...sizes) : Math.min(...sizes),
		failures: []
	};
	row.failures = mistake === null ? taughtFailures(row, outcomes, tolerance) : mistakeFailures(row, outcomes);
	return row;
}

function taughtFailures(
	{ passShare, bias, done }: ProofRow,
	outcomes: readonly Outcome[],
	tolerance: number
): string[] {
	const failures: string[] = [];
	if (passShare < LIMITS.taughtPasses) {
		failures.push(`passes on ${percent(passShare)}, at least ${percent(LIMITS.taughtPasses)} asked`);
	}
	const made = outcomes.filter(({ error }) => error !== null);
	const scatter = Math.max(
		deviation(made.map((outcome) => outcome.bias)),
		mean(made.map(({ spread }) => spread))
	);
	const allowed = BIAS_SHARE * tolerance + (STANDARD_ERRORS * scatter) / Math.sqrt(Math.max(1, done));
	if (done >= BIAS_SEEDS && Math.abs(bias) > allowed) {
		failures.push(`is off by ${brief(bias)} on average, at most ${brief(allowed)} allowed`);
	}
	return failures;
}

function mistakeFailures({ passShare, namedShare, done }: ProofRow, outcomes: readonly Outcome[]): string[] {
	const failures: string[] = [];
	if (done < LIMITS.made * outcomes.length) {
		const problem = outcomes.find((outcome) => outcome.problem)?.problem;
		failures.push(`could be made on ${percent(done / outcomes.length)} only (${problem})`);
	}
	if (passShare > LIMITS.mistakePasses) {
		failures.push(`passes on ${percent(passShare)}, at most ${percent(LIMITS.mistakePasses)} allowed`);
	}
	if (namedShare < LIMITS.named) {
		failures.push(`is named on ${percent(namedShare)}, at least ${percent(LIMITS.named)} asked`);
	}
	return failures;
}

/** What all seeds together say, and whether the exercise may be published. */
export function proofTable(
	exercise: string,
	fromSeed: number,
	proofs: readonly SeedProof[],
	tolerances: ReadonlyMap<string, number>
): ProofTable {
	const groups = new Map<string, Outcome[]>();
	for (const outcome of proofs.flatMap((proof) => proof.outcomes)) {
		const key = `${outcome.question}|${outcome.mistake ?? ''}`;
		groups.set(key, [...(groups.get(key) ?? []), outcome]);
	}
	const rows = [...groups.values()].map((outcomes) =>
		rowOf(outcomes, tolerances.get(outcomes[0].question) ?? 0)
	);
	const apart = proofs.filter(({ nearest }) => nearest.every(({ spreads }) => spreads >= SPREADS_APART));
	const apartShare = apart.length / Math.max(1, proofs.length);
	const failures = rows.flatMap((row) =>
		row.failures.map((failure) => `${row.question}: ${row.mistake ?? 'the taught method'} ${failure}`)
	);
	if (apartShare < LIMITS.made) {
		failures.push(`mistakes lie ${SPREADS_APART} spreads apart on ${percent(apartShare)} of the seeds only`);
	}
	failures.push(...tightFailures(proofs));
	return {
		exercise,
		fromSeed,
		seeds: proofs.length,
		redraws: proofs.reduce((sum, proof) => sum + proof.redraws, 0),
		rows,
		apartShare,
		failures,
		passed: failures.length === 0
	};
}

function tightFailures(proofs: readonly SeedProof[]): string[] {
	const worst = new Map<string, number>();
	for (const { question, least } of proofs.flatMap((proof) => proof.tooTight)) {
		worst.set(question, Math.max(least, worst.get(question) ?? 0));
	}
	return [...worst].map(
		([question, least]) =>
			`${question}: the tolerance must be at least the receiver’s own error and three spreads, ${brief(least)}`
	);
}

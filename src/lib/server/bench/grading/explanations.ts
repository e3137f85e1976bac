import type { Evidence, Source } from './evidence';
import { isMadeWith, type SetUp } from './mistake';
import { readSpreadDb } from './noise-in-reading';
import { ownError } from './own-error';
import { copyingSpread, modelSpread } from './spreads';
import { supports } from './supports';
import type { Watched } from './watched-mistakes';

/** One way the answer may have come about: the mistakes it takes, and the number they give at the reference plane. */
export interface Candidate {
	watched: Watched[];
	value: number;
	spread: number;
	source?: Source;
	setUp?: SetUp;
}

const shownBy = (source: Source, watched: readonly Watched[], evidence: Evidence): Watched[] =>
	watched.filter(
		({ mistake }) =>
			mistake.stage === 'reading' && isMadeWith(mistake, source) && mistake.shows(source, evidence)
	);

/** What a reading gives, by the mistakes it shows: those that make the same number of it are made together. */
export function fromSource(source: Source, watched: readonly Watched[], evidence: Evidence): Candidate[] {
	const byValue = new Map<string, Candidate>();
	for (const shown of shownBy(source, watched, evidence)) {
		if (shown.mistake.stage !== 'reading') continue;
		const value = shown.mistake.fromReading?.(source, evidence) ?? source.cleanValue;
		if (!Number.isFinite(value)) continue;
		const known = byValue.get(value.toFixed(6));
		if (known) known.watched.push(shown);
		else {
			const spread = copyingSpread(evidence.question);
			byValue.set(value.toFixed(6), { watched: [shown], value, spread, source, setUp: source.setUp });
		}
	}
	return [...byValue.values()];
}

/**
 * What theory gives for each set-up that swept, when no reading says what was done. A set-up in which the mistake would give almost
 * any number (a spread wider than the tolerance) explains nothing.
 */
function fromTheory(watched: readonly Watched[], evidence: Evidence): Candidate[] {
	const error = ownError(evidence);
	return watched.flatMap((one) =>
		evidence.setUps.flatMap((setUp): Candidate[] => {
			if (one.mistake.stage !== 'reading') return [];
			const predicted = one.mistake.predict(evidence, setUp);
			if (!predicted || predicted.spread > evidence.question.tolerance) return [];
			return [{ watched: [one], value: predicted.value + error, spread: predicted.spread, setUp }];
		})
	);
}

/** Right readings, for slips to start from: those taken, else what this receiver would show. */
function rightOnes(watched: readonly Watched[], evidence: Evidence): Candidate[] {
	const spread = copyingSpread(evidence.question);
	const right = evidence.pool.filter(
		(source) =>
			Number.isFinite(source.cleanValue) &&
			supports(source, evidence.question) &&
			shownBy(source, watched, evidence).length === 0
	);
	if (right.length > 0) {
		return right.map((source) => ({
			watched: [],
			value: source.cleanValue,
			spread,
			source,
			setUp: source.setUp
		}));
	}
	if (evidence.attached) return [];
	const value = evidence.question.truth + ownError(evidence);
	const [setUp] = evidence.setUps;
	const noisy = evidence.question.noiseTakenOff && setUp ? readSpreadDb(evidence, setUp) : 0;
	// In so much noise there is no right reading to start from.
	if (noisy > evidence.question.tolerance) return [];
	return [{ watched: [], value, spread: Math.hypot(modelSpread(evidence.question), noisy), setUp }];
}

function slipped(from: readonly Candidate[], watched: readonly Watched[], evidence: Evidence): Candidate[] {
	return from.flatMap((base) =>
		watched.flatMap((slip): Candidate[] => {
			if (slip.mistake.stage !== 'slip') return [];
			const { setUp, source } = base;
			const change = slip.mistake.change(evidence, setUp, source);
			if (change === null) return [];
			const value = slip.mistake.given?.(base.value, evidence) ?? base.value + change;
			const unsure = source || !setUp ? 0 : (slip.mistake.spread?.(evidence, setUp) ?? 0);
			return [{ ...base, watched: [...base.watched, slip], value, spread: Math.hypot(base.spread, unsure) }];
		})
	);
}

/** Every way to a wrong number that the log doesn't rule out. Whoever took a reading read that, and nothing else. */
export function explanations(watched: readonly Watched[], evidence: Evidence): Candidate[] {
	const made =
		evidence.pool.length > 0
			? evidence.pool.flatMap((source) => fromSource(source, watched, evidence))
			: fromTheory(watched, evidence);
	return [
		...made,
		...slipped(rightOnes(watched, evidence), watched, evidence),
		...slipped(made, watched, evidence)
	];
}

/** What a figure's readings draw on its plot: markers, and brackets under the trace. */
import type { FigureOutcome } from '$lib/schemas/figure-view';
import type { ReadingRequest } from '$lib/schemas/reading';
import { formatFrequency } from '$lib/units/format-quantity';
import { readingPlace, readingWords } from '../bench/readings/reading-words';
import { shownReading } from '../bench/shown-quantity';

export interface FigureFlag {
	letter: string;
	at: number;
	levelDbm: number;
}
export interface FigureBand {
	start: number;
	stop: number;
	figure: string;
	unit: string;
	what: string;
}
export interface FigureMarks {
	/** The name of each reading, markers with their letters. */
	names: string[];
	flags: FigureFlag[];
	bands: FigureBand[];
}

type Taken = Extract<FigureOutcome, { value: number }>;
interface Place {
	frequencyHz?: number;
	timeS?: number;
}
const placeOf = (parts: unknown): number | undefined => {
	const { frequencyHz, timeS } = (parts ?? {}) as Place;
	return frequencyHz ?? timeS;
};

/** Lays out the readings of one state. @param outcomes in the order of the requests; none where there is no trace */
export function figureMarks(
	requests: readonly ReadingRequest[],
	outcomes: readonly FigureOutcome[]
): FigureMarks {
	const marks: FigureMarks = { names: [], flags: [], bands: [] };
	let letters = 0;
	const nextLetter = () => String.fromCharCode(65 + letters++);
	requests.forEach((request, i) => {
		const outcome = outcomes[i];
		const taken = outcome && 'value' in outcome ? outcome : undefined;
		switch (request.kind) {
			case 'marker':
			case 'peak':
			case 'next-peak':
			case 'minimum': {
				const letter = nextLetter();
				marks.names.push(markerName(letter, request));
				const at = request.kind === 'marker' ? (request.atHz ?? request.atS) : placeOf(taken?.parts);
				if (taken && at !== undefined) marks.flags.push({ letter, at, levelDbm: taken.value });
				return;
			}
			case 'delta': {
				const [from, to] = [nextLetter(), nextLetter()];
				marks.names.push(`${to} less ${from}`);
				if (taken) marks.flags.push(...deltaFlags(request, taken, from, to));
				return;
			}
			default:
				marks.names.push(nameAmong(requests, request));
				if (taken) marks.bands.push(...bandsOf(request, taken));
		}
	});
	return marks;
}

/** A reading's words, with its window and place where they would else be another's too. */
function nameAmong(requests: readonly ReadingRequest[], request: ReadingRequest): string {
	const words = readingWords(request);
	if (requests.filter((other) => readingWords(other) === words).length === 1) return words;
	const centreHz = readingPlace(request);
	const place = centreHz === undefined ? ' of all shown' : ` at ${formatFrequency(centreHz)}`;
	const isWindow = request.kind === 'occupied-bandwidth' && request.widthHz !== undefined;
	return words + (isWindow ? ` within ${formatFrequency(request.widthHz!)}` : place);
}

function markerName(letter: string, request: ReadingRequest): string {
	if (request.kind !== 'marker') return `${letter}, ${readingWords(request).toLowerCase()}`;
	return request.atHz === undefined
		? `Marker ${letter}`
		: `Marker ${letter}, ${formatFrequency(request.atHz)}`;
}

function deltaFlags(
	request: Extract<ReadingRequest, { kind: 'delta' }>,
	{ parts }: Taken,
	from: string,
	to: string
): FigureFlag[] {
	const { fromDbm, toDbm } = parts as { fromDbm: number; toDbm: number };
	const [fromAt, toAt] = [request.fromHz ?? request.fromS, request.toHz ?? request.toS];
	if (fromAt === undefined || toAt === undefined) return [];
	return [
		{ letter: from, at: fromAt, levelDbm: fromDbm },
		{ letter: to, at: toAt, levelDbm: toDbm }
	];
}

function bandsOf(request: ReadingRequest, taken: Taken): FigureBand[] {
	const { figure, unit } = shownReading(taken.value, taken.unit);
	const about = (centreHz: number, widthHz: number): FigureBand[] => [
		{ start: centreHz - widthHz / 2, stop: centreHz + widthHz / 2, figure, unit, what: readingWords(request) }
	];
	switch (request.kind) {
		case 'channel-power':
		case 'power-density':
			return about(request.centreHz, request.widthHz);
		case 'band-power':
			return about((request.startHz + request.stopHz) / 2, request.stopHz - request.startHz);
		case 'occupied-bandwidth':
		case 'x-db-bandwidth': {
			const { lowerHz, upperHz } = taken.parts as { lowerHz: number; upperHz: number };
			return about((lowerHz + upperHz) / 2, upperHz - lowerHz);
		}
		case 'adjacent-channel':
			return (taken.parts as { offsetHz: number; side: 'lower' | 'upper'; dbc: number }[]).flatMap(
				(part, i) => {
					const { widthHz } = request.offsets[Math.floor(i / 2)];
					const sign = part.side === 'lower' ? -1 : 1;
					const [band] = about(request.centreHz + sign * part.offsetHz, widthHz);
					return [{ ...band, ...shownReading(part.dbc, 'dBc'), what: `${part.side} neighbour` }];
				}
			);
		default:
			return [];
	}
}

/** What the desk asks of the server. A failure's message is fit to be shown. */
import type {
	DraftFileView,
	FileVersionText,
	FileVersionView,
	PresenceView,
	SavedFile
} from '$lib/schemas/desk';
import type { FigureChoice } from '$lib/schemas/figure';
import type { FigureState } from '$lib/schemas/figure-view';
import type { ExercisePreview, LessonPreview } from '$lib/schemas/preview-view';
import type { ProofState } from '$lib/schemas/proof-view';

/** Somebody else has saved in between. */
export class SaveConflict extends Error {
	override name = 'SaveConflict';
	constructor(
		message: string,
		readonly theirs: DraftFileView
	) {
		super(message);
	}
}

export interface DeskWire {
	/** @throws SaveConflict */
	save(text: string, revision: number): Promise<SavedFile>;
	/** @throws SaveConflict */
	restore(versionId: number, revision: number): Promise<SavedFile>;
	presence(): Promise<PresenceView>;
	versions(): Promise<FileVersionView[]>;
	version(id: number): Promise<FileVersionText>;
	previewLesson(text: string): Promise<LessonPreview>;
	turnFigure(text: string, id: string, values: readonly FigureChoice[]): Promise<FigureState>;
	previewExercise(text: string, seed: number): Promise<ExercisePreview>;
	proof(): Promise<ProofState>;
	askForProof(): Promise<ProofState>;
	cancelProof(): Promise<ProofState>;
}

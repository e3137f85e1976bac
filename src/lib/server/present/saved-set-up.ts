import type { SavedSetUpView } from '$lib/schemas/saved-set-up';
import type { Settings } from '$lib/schemas/settings';

export const presentSavedSetUp = (saved: {
	id: number;
	name: string;
	settings: Settings;
	savedAt: Date;
}): SavedSetUpView => ({
	id: saved.id,
	name: saved.name,
	settings: saved.settings,
	savedAt: saved.savedAt.toISOString()
});

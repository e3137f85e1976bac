/** A set-up as a small file of our own, written and read again. */
import { setUpFile, type SetUpFile } from '$lib/schemas/saved-set-up';
import type { Settings } from '$lib/schemas/settings';
import { settingWords } from '../setup/setup-words';

/** Nothing of ours comes near this; whatever is longer is no set-up, characters. */
const mostCharacters = 65_536;

export const writeSetUp = (settings: Settings, receiver: string, at: Date): string => {
	const file: SetUpFile = {
		sweepwright: 'set-up',
		version: 1,
		receiver,
		savedAt: at.toISOString(),
		settings
	};
	return `${JSON.stringify(file, null, '\t')}\n`;
};

export type ReadSetUp = { ok: true; settings: Settings } | { ok: false; message: string };

/** The settings in a file's text, or why there are none, naming each field that is wrong. */
export function readSetUp(text: string): ReadSetUp {
	if (text.length > mostCharacters) return { ok: false, message: 'That file is too long to be a set-up.' };
	let json: unknown;
	try {
		json = JSON.parse(text);
	} catch {
		return { ok: false, message: 'That file is no set-up: it isn’t JSON.' };
	}
	const parsed = setUpFile.safeParse(json);
	if (parsed.success) return { ok: true, settings: parsed.data.settings };
	const [first] = parsed.error.issues;
	if (first.path[0] !== 'settings') return { ok: false, message: 'That file is no set-up of this program.' };
	const reasons = parsed.error.issues.slice(0, 5).map(({ path, message }) => {
		const field = path.slice(1).join('.');
		return field ? `${settingWords[String(path[1])] ?? field}: ${message}` : message;
	});
	return { ok: false, message: `The set-up in that file is not right. ${reasons.join('; ')}.` };
}

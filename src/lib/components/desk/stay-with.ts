import type { FileEditor } from './file-editor.svelte';

/** Somebody else who opens the file is told of within so long. */
const LOOK_EVERY_MS = 10_000;

/** Tells that a file is open as long as its page is, and warns of leaving what isn't kept. @returns how to stop */
export function stayWith(editor: FileEditor): () => void {
	void editor.lookAround();
	const timer = setInterval(() => void editor.lookAround(), LOOK_EVERY_MS);
	const warn = (event: BeforeUnloadEvent) => {
		if (editor.changed) event.preventDefault();
	};
	window.addEventListener('beforeunload', warn);
	return () => {
		clearInterval(timer);
		window.removeEventListener('beforeunload', warn);
		void editor.keep();
	};
}

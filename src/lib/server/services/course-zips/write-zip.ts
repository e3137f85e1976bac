import yazl from 'yazl';

/** No file of a zip says when it was made, so that the same files always make the same zip. */
const MADE_AT = new Date('2000-01-01T00:00:00Z');

/** Files as a zip, in the order of their names. */
export async function zipOf(files: ReadonlyMap<string, Uint8Array>): Promise<Buffer> {
	const zip = new yazl.ZipFile();
	for (const path of [...files.keys()].sort())
		zip.addBuffer(Buffer.from(files.get(path) as Uint8Array), path, { mtime: MADE_AT, mode: 0o100644 });
	zip.end();
	const chunks: Buffer[] = [];
	for await (const chunk of zip.outputStream) chunks.push(chunk as Buffer);
	return Buffer.concat(chunks);
}

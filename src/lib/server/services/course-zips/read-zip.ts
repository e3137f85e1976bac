import yauzl, { type Entry, type ZipFile } from 'yauzl';
import { DomainError } from '$lib/server/errors';

/** What a zip of a course may be. A course of fifteen units with its pictures stays far below. */
export const ZIP_LIMITS = {
	zipBytes: 12 * 1024 * 1024,
	entries: 2000,
	entryBytes: 4 * 1024 * 1024,
	totalBytes: 50 * 1024 * 1024,
	/** Inflated to deflated; texts come to ten. */
	ratio: 200
} as const;

const refused = (message: string): DomainError => new DomainError('invalid', message, { issues: [] });
const inMegabytes = (bytes: number): string => `${Math.round(bytes / 1024 / 1024)} MB`;

/**
 * The files of a zip by their paths. What it claims is checked before anything is inflated, and nothing is inflated
 * further than it claims.
 * @throws DomainError `invalid` with the reason
 */
export async function filesOfZip(bytes: Buffer): Promise<Map<string, Uint8Array>> {
	if (bytes.length > ZIP_LIMITS.zipBytes)
		throw refused(`The zip is larger than ${inMegabytes(ZIP_LIMITS.zipBytes)}.`);
	const zip = await open(bytes);
	const entries = await entriesOf(zip);
	const files = new Map<string, Uint8Array>();
	for (const entry of entries) files.set(entry.fileName, await contentOf(zip, entry));
	return files;
}

/** What the library throws is about the file, not about us: damaged, or made to deceive. */
const asRefusal = (cause: Error): DomainError =>
	refused(`This is no zip that can be read: ${cause.message}.`);

const open = (bytes: Buffer): Promise<ZipFile> =>
	new Promise((resolve, reject) => {
		yauzl.fromBuffer(
			bytes,
			{ lazyEntries: true, validateEntrySizes: true, strictFileNames: true },
			(cause, zip) => (cause ? reject(asRefusal(cause)) : resolve(zip))
		);
	});

function entriesOf(zip: ZipFile): Promise<Entry[]> {
	if (zip.entryCount > ZIP_LIMITS.entries)
		throw refused(`The zip has ${zip.entryCount} entries; at most ${ZIP_LIMITS.entries} are taken.`);
	return new Promise((resolve, reject) => {
		const entries: Entry[] = [];
		const seen = new Set<string>();
		let total = 0;
		zip.on('error', (cause: Error) => reject(asRefusal(cause)));
		zip.on('end', () => resolve(entries));
		zip.on('entry', (entry: Entry) => {
			const problem = problemOf(entry, seen);
			total += entry.uncompressedSize;
			if (problem) return reject(refused(problem));
			if (total > ZIP_LIMITS.totalBytes)
				return reject(refused(`The zip holds more than ${inMegabytes(ZIP_LIMITS.totalBytes)}.`));
			seen.add(entry.fileName);
			if (!entry.fileName.endsWith('/')) entries.push(entry);
			zip.readEntry();
		});
		zip.readEntry();
	});
}

const FILE_TYPE = 0o170000;
const ENCRYPTED = 1;

function problemOf(entry: Entry, seen: ReadonlySet<string>): string | null {
	const { fileName, uncompressedSize, compressedSize, externalFileAttributes, generalPurposeBitFlag } = entry;
	const type = (externalFileAttributes >>> 16) & FILE_TYPE;
	if (seen.has(fileName)) return `${fileName} is in the zip twice.`;
	if (generalPurposeBitFlag & ENCRYPTED) return `${fileName} is encrypted.`;
	if (type !== 0 && type !== 0o100000 && type !== 0o040000)
		return `${fileName} is neither a file nor a folder.`;
	if (uncompressedSize > ZIP_LIMITS.entryBytes)
		return `${fileName} is larger than ${inMegabytes(ZIP_LIMITS.entryBytes)}.`;
	if (uncompressedSize > 1024 && uncompressedSize > ZIP_LIMITS.ratio * compressedSize)
		return `${fileName} would unpack to more than ${ZIP_LIMITS.ratio} times its size.`;
	return null;
}

function contentOf(zip: ZipFile, entry: Entry): Promise<Uint8Array> {
	return new Promise((resolve, reject) => {
		zip.openReadStream(entry, (cause, stream) => {
			if (cause) return reject(asRefusal(cause));
			const chunks: Buffer[] = [];
			stream.on('data', (chunk: Buffer) => chunks.push(chunk));
			stream.on('error', (fault: Error) => reject(asRefusal(fault)));
			stream.on('end', () => resolve(Buffer.concat(chunks)));
		});
	});
}

/**
 * The binary frames of a sweep stream, little-endian, for both ends of the wire.
 *
 * | byte | field | |
 * |---|---|---|
 * | 0 | magic u16 | 0x5357 |
 * | 2 | type u8 | 1 piece of a row, 2 state (JSON), 3 end (JSON) |
 * | 3 | flags u8 | bit 0: the row is complete with this piece; bit 1: its bench time had passed before this stream began |
 * | 4 | row u32 | number of the row in the attempt; for state and end, the attempt's next row |
 * | 8 | fromPoint u16 | index of the piece's first point |
 * | 10 | pointCount u16 | points in the piece |
 * | 12 | points u16 | points in the whole row |
 * | 14 | reserved u16 | 0 |
 * | 16 | clockS f64 | bench clock when the piece ends, s |
 * | 24 | speedUp f32 | bench seconds per real second |
 * | 28 | payloadBytes u32 | what follows: float32 levels in dBm, or UTF-8 JSON |
 */
export const FRAME_HEADER_BYTES = 32;
const MAGIC = 0x5357;
/** Nothing longer is ever sent: 65 535 points of four bytes. A larger figure means the stream is not ours. */
const MAX_PAYLOAD_BYTES = 4 * 65535;
const TYPE = { piece: 1, state: 2, end: 3 } as const;

/** A stretch of one row, levels in dBm. */
export interface PieceFrame {
	type: 'piece';
	row: number;
	fromPoint: number;
	points: number;
	/** The row is complete with this piece. */
	last: boolean;
	/** Its bench time had passed before this stream began, so it came unpaced. */
	resent: boolean;
	clockS: number;
	speedUp: number;
	levelsDbm: Float32Array;
}

/** State or end of a stream: `json` is parsed but not yet checked (see `streamState`, `streamEnd` in schemas/attempt). */
export interface NoteFrame {
	type: 'state' | 'end';
	row: number;
	clockS: number;
	speedUp: number;
	json: unknown;
}
export type Frame = PieceFrame | NoteFrame;

/** The bytes are not a sweep stream. */
export class FrameError extends Error {
	override name = 'FrameError';
}

/** One frame as bytes. Levels go as float32, so that what is drawn is what the receiver left. */
export function encodeFrame(frame: Frame): Uint8Array<ArrayBuffer> {
	return frame.type === 'piece' ? encodePiece(frame) : encodeNote(frame);
}

function encodePiece(frame: PieceFrame): Uint8Array<ArrayBuffer> {
	const count = frame.levelsDbm.length;
	if (count < 1 || frame.fromPoint + count > frame.points || frame.points > 65535) {
		throw new FrameError(
			`a piece of ${count} points from ${frame.fromPoint} does not fit a row of ${frame.points}`
		);
	}
	const bytes = new Uint8Array(FRAME_HEADER_BYTES + 4 * count);
	const view = new DataView(bytes.buffer);
	writeHeader(view, TYPE.piece, (frame.last ? 1 : 0) | (frame.resent ? 2 : 0), frame, 4 * count);
	view.setUint16(8, frame.fromPoint, true);
	view.setUint16(10, count, true);
	view.setUint16(12, frame.points, true);
	for (let i = 0; i < count; i++) view.setFloat32(FRAME_HEADER_BYTES + 4 * i, frame.levelsDbm[i], true);
	return bytes;
}

function encodeNote(frame: NoteFrame): Uint8Array<ArrayBuffer> {
	const payload = new TextEncoder().encode(JSON.stringify(frame.json));
	if (payload.length > MAX_PAYLOAD_BYTES)
		throw new FrameError(`a ${frame.type} of ${payload.length} bytes is too long`);
	const bytes = new Uint8Array(FRAME_HEADER_BYTES + payload.length);
	writeHeader(new DataView(bytes.buffer), TYPE[frame.type], 0, frame, payload.length);
	bytes.set(payload, FRAME_HEADER_BYTES);
	return bytes;
}

function writeHeader(view: DataView, type: number, flags: number, frame: Frame, payloadBytes: number): void {
	view.setUint16(0, MAGIC, true);
	view.setUint8(2, type);
	view.setUint8(3, flags);
	view.setUint32(4, frame.row, true);
	view.setFloat64(16, frame.clockS, true);
	view.setFloat32(24, frame.speedUp, true);
	view.setUint32(28, payloadBytes, true);
}

/** Takes a byte stream apart as it arrives, however it was cut. One decoder a stream. */
export class FrameDecoder {
	#held: Uint8Array = new Uint8Array(0);

	/**
	 * Adds bytes and gives every frame they complete, in order.
	 * @throws FrameError at the first byte that cannot belong to a sweep stream
	 */
	push(chunk: Uint8Array): Frame[] {
		const bytes = this.#held.length === 0 ? chunk : joined(this.#held, chunk);
		const frames: Frame[] = [];
		let at = 0;
		while (bytes.length - at >= FRAME_HEADER_BYTES) {
			const view = new DataView(bytes.buffer, bytes.byteOffset + at, bytes.length - at);
			const frameBytes = FRAME_HEADER_BYTES + checkedPayloadBytes(view);
			if (bytes.length - at < frameBytes) break;
			frames.push(decodeFrame(view, frameBytes - FRAME_HEADER_BYTES));
			at += frameBytes;
		}
		this.#held = bytes.slice(at);
		return frames;
	}

	/** True while part of a frame is held: a stream that ends now was cut off. */
	get partial(): boolean {
		return this.#held.length > 0;
	}
}

function joined(head: Uint8Array, tail: Uint8Array): Uint8Array {
	const whole = new Uint8Array(head.length + tail.length);
	whole.set(head);
	whole.set(tail, head.length);
	return whole;
}

function checkedPayloadBytes(view: DataView): number {
	if (view.getUint16(0, true) !== MAGIC) throw new FrameError('not a sweep stream');
	const payloadBytes = view.getUint32(28, true);
	if (payloadBytes > MAX_PAYLOAD_BYTES) throw new FrameError(`a frame of ${payloadBytes} bytes is too long`);
	return payloadBytes;
}

function decodeFrame(view: DataView, payloadBytes: number): Frame {
	const type = view.getUint8(2);
	const common = {
		row: view.getUint32(4, true),
		clockS: view.getFloat64(16, true),
		speedUp: view.getFloat32(24, true)
	};
	if (type === TYPE.piece) return { type: 'piece', ...common, ...pieceOf(view, payloadBytes) };
	if (type !== TYPE.state && type !== TYPE.end) throw new FrameError(`unknown frame type ${type}`);
	const payload = new Uint8Array(view.buffer, view.byteOffset + FRAME_HEADER_BYTES, payloadBytes);
	return { type: type === TYPE.state ? 'state' : 'end', ...common, json: parsedJson(payload) };
}

function pieceOf(view: DataView, payloadBytes: number) {
	const flags = view.getUint8(3);
	const fromPoint = view.getUint16(8, true);
	const count = view.getUint16(10, true);
	const points = view.getUint16(12, true);
	if (payloadBytes !== 4 * count || count < 1 || fromPoint + count > points) {
		throw new FrameError(`a piece of ${count} points from ${fromPoint} does not fit a row of ${points}`);
	}
	const levelsDbm = new Float32Array(count);
	for (let i = 0; i < count; i++) levelsDbm[i] = view.getFloat32(FRAME_HEADER_BYTES + 4 * i, true);
	return { fromPoint, points, last: (flags & 1) !== 0, resent: (flags & 2) !== 0, levelsDbm };
}

function parsedJson(payload: Uint8Array): unknown {
	try {
		return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(payload));
	} catch (cause) {
		throw new FrameError('a state or end frame holds no JSON', { cause });
	}
}

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { encodeFrame, FrameDecoder, FrameError, FRAME_HEADER_BYTES, type Frame } from '$lib/schemas/frames';

const clockS = fc.double({ min: 0, max: 1e6, noNaN: true });
const speedUp = fc.constantFrom(1, 2, 5, 10, 500);
const row = fc.integer({ min: 0, max: 2 ** 32 - 2 });
const piece = fc
	.record({
		row,
		clockS,
		speedUp,
		resent: fc.boolean(),
		levels: fc.array(fc.float({ min: -200, max: 50, noNaN: true }), { minLength: 1, maxLength: 40 }),
		before: fc.nat(20),
		after: fc.nat(20)
	})
	.map(({ levels, before, after, ...rest }): Frame => ({
		type: 'piece',
		...rest,
		fromPoint: before,
		points: before + levels.length + after,
		last: after === 0,
		levelsDbm: Float32Array.from(levels)
	}));
const note = fc
	.record({ type: fc.constantFrom('state' as const, 'end' as const), row, clockS, speedUp })
	.map((rest): Frame => ({ ...rest, json: { reason: 'done', message: 'Fertig ± µ −', nextRow: rest.row } }));
const frames = fc.array(fc.oneof(piece, note), { maxLength: 8 });

const joined = (parts: Uint8Array[]): Uint8Array => Uint8Array.from(parts.flatMap((part) => [...part]));

describe('encodeFrame(frame) and FrameDecoder', () => {
	it('give back every frame, however the bytes were cut', () => {
		fc.assert(
			fc.property(frames, fc.array(fc.integer({ min: 1, max: 60 }), { minLength: 1 }), (sent, cuts) => {
				const bytes = joined(sent.map(encodeFrame));
				const decoder = new FrameDecoder();
				const got: Frame[] = [];
				for (let at = 0, cut = 0; at < bytes.length; cut++) {
					const next = at + cuts[cut % cuts.length];
					got.push(...decoder.push(bytes.subarray(at, next)));
					at = next;
				}
				expect(got).toEqual(sent);
				expect(decoder.partial).toBe(false);
			})
		);
	});

	it('say that a stream was cut off inside a frame', () => {
		const bytes = encodeFrame({ type: 'end', row: 3, clockS: 1, speedUp: 1, json: { reason: 'done' } });
		const decoder = new FrameDecoder();
		expect(decoder.push(bytes.subarray(0, bytes.length - 1))).toEqual([]);
		expect(decoder.partial).toBe(true);
	});

	it('lay a piece out as documented, little-endian', () => {
		const bytes = encodeFrame({
			type: 'piece',
			row: 0x01020304,
			fromPoint: 5,
			points: 1001,
			last: false,
			resent: true,
			clockS: 2.5,
			speedUp: 10,
			levelsDbm: Float32Array.of(-47.25)
		});
		expect(bytes.length).toBe(FRAME_HEADER_BYTES + 4);
		expect([...bytes.subarray(0, 8)]).toEqual([0x57, 0x53, 1, 2, 4, 3, 2, 1]);
		const view = new DataView(bytes.buffer);
		expect([8, 10, 12, 14].map((at) => view.getUint16(at, true))).toEqual([5, 1, 1001, 0]);
		expect(view.getFloat64(16, true)).toBe(2.5);
		expect(view.getFloat32(24, true)).toBe(10);
		expect(view.getUint32(28, true)).toBe(4);
		expect(view.getFloat32(32, true)).toBe(-47.25);
	});

	it('keep its frames when the buffer they came in is used again', () => {
		const bytes = encodeFrame({
			type: 'piece',
			row: 1,
			fromPoint: 0,
			points: 2,
			last: true,
			resent: false,
			clockS: 0,
			speedUp: 1,
			levelsDbm: Float32Array.of(-1, -2)
		});
		const [frame] = new FrameDecoder().push(bytes);
		bytes.fill(0);
		expect(frame).toMatchObject({ levelsDbm: Float32Array.of(-1, -2) });
	});

	it('refuse bytes that are no sweep stream, and nothing but by FrameError', () => {
		fc.assert(
			fc.property(fc.uint8Array({ minLength: FRAME_HEADER_BYTES, maxLength: 200 }), (bytes) => {
				fc.pre(bytes[0] !== 0x57 || bytes[1] !== 0x53);
				expect(() => new FrameDecoder().push(bytes)).toThrow(FrameError);
			})
		);
		const good = encodeFrame({ type: 'end', row: 0, clockS: 0, speedUp: 1, json: {} });
		fc.assert(
			fc.property(
				fc.integer({ min: 2, max: good.length - 1 }),
				fc.integer({ min: 0, max: 255 }),
				(at, byte) => {
					const bent = good.slice();
					bent[at] = byte;
					try {
						expect(new FrameDecoder().push(bent).length).toBeLessThanOrEqual(1);
					} catch (cause) {
						expect(cause).toBeInstanceOf(FrameError);
					}
				}
			)
		);
	});

	it('refuse to encode a piece that does not fit its row', () => {
		const levelsDbm = Float32Array.of(1, 2, 3);
		const wrong: Frame = {
			type: 'piece',
			row: 0,
			fromPoint: 1,
			points: 3,
			last: true,
			resent: false,
			clockS: 0,
			speedUp: 1,
			levelsDbm
		};
		expect(() => encodeFrame(wrong)).toThrow(FrameError);
	});
});

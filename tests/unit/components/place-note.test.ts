import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placeNote } from '$lib/components/glossary/place-note';

const window = { width: 390, height: 800 };

describe('placeNote(word, note, window)', () => {
	it('stands under its word, and over it where there is no room below', () => {
		expect(placeNote({ left: 40, top: 100, bottom: 120 }, { width: 200, height: 60 }, window)).toEqual({
			left: 40,
			top: 126
		});
		expect(placeNote({ left: 40, top: 740, bottom: 760 }, { width: 200, height: 60 }, window).top).toBe(674);
	});

	it('never reaches over the sides of the window', () => {
		const left = fc.integer({ min: -50, max: 500 });
		const width = fc.integer({ min: 10, max: 360 });
		fc.assert(
			fc.property(left, width, (at, wide) => {
				const placed = placeNote({ left: at, top: 9, bottom: 29 }, { width: wide, height: 50 }, window);
				return placed.left >= 12 && placed.left + wide <= window.width - 12;
			})
		);
	});
});

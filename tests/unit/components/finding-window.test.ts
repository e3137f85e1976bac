import { describe, expect, it } from 'vitest';
import { findingWindow } from '$lib/components/finding/finding-window';

describe('findingWindow(levelsDbm, marksDbm)', () => {
	const floor = new Float32Array(1000).fill(-104);
	floor[500] = -23;

	it('shows the highest mark with air above it', () => expect(findingWindow([floor], [-9.7]).topDbm).toBe(0));
	it('shows the foot of the sweep', () =>
		expect(findingWindow([floor], [-9.7]).bottomDbm).toBeLessThan(-104));
	it('has a round line near the top', () => expect(findingWindow([floor], [6]).referenceDbm % 20).toBe(0));
	it('stands without a sweep', () => {
		const { topDbm, bottomDbm } = findingWindow([[], []], []);
		expect(topDbm).toBeGreaterThan(bottomDbm);
	});
});

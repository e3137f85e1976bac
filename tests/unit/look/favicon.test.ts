import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { sweepPath } from '$lib/components/ui/sweep-path';

it('shows the same w as the wordmark', () => {
	expect(readFileSync('static/favicon.svg', 'utf8')).toContain(`d="${sweepPath()}"`);
});

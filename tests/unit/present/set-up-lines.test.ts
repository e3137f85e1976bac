import { expect, it } from 'vitest';
import { setUpLines } from '$lib/components/bench/keep/set-up-lines';
import { presentSetUp } from '$lib/server/present/set-up-lines';
import { resolved } from '../components/resolved-settings';

it('a set-up in the logbook has the words that the bench has for it, the edges of the span apart', () => {
	const bench = setUpLines(resolved).map(({ label, text }) => [label, text.replace(/ \(.*\)$/, '')]);
	expect(presentSetUp(resolved).map(({ label, text }) => [label, text])).toEqual(bench);
});

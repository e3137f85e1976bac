import { describe, expect, it } from 'vitest';
import { lockFilesAgree } from '../../../src/cli/ground/packages.js';

const wanted = {
	packages: {
		'': {},
		'node_modules/a': { version: '1.0.0' },
		'node_modules/other-machine': { version: '1.0.0', optional: true }
	}
};

describe('lockFilesAgree(wanted, installed)', () => {
	it('is content without the optional packages of other machines', () => {
		expect(lockFilesAgree(wanted, { packages: { 'node_modules/a': { version: '1.0.0' } } })).toBe(true);
	});

	it('sees a package that is missing, of another version, or not wanted any more', () => {
		const a = { version: '1.0.0' };
		expect(lockFilesAgree(wanted, { packages: {} })).toBe(false);
		expect(lockFilesAgree(wanted, { packages: { 'node_modules/a': { version: '1.0.1' } } })).toBe(false);
		expect(lockFilesAgree(wanted, { packages: { 'node_modules/a': a, 'node_modules/b': a } })).toBe(false);
	});

	it('sees an optional package of another version', () => {
		const installed = {
			packages: { 'node_modules/a': { version: '1.0.0' }, 'node_modules/other-machine': { version: '2.0.0' } }
		};
		expect(lockFilesAgree(wanted, installed)).toBe(false);
	});
});

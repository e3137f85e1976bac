import { tmpdir } from 'node:os';
import { describe, expect, it } from 'vitest';
import { socketPath } from '../../../src/cli/mariadb/place';

describe('socketPath(folder)', () => {
	it('lies beside the data where the path is short', () => {
		expect(socketPath('/home/mara/sweepwright/.data/mariadb')).toBe(
			'/home/mara/sweepwright/.data/mariadb/server.sock'
		);
	});

	it('moves to the temp folder, under a name of its own, where the kernel would refuse the path', () => {
		const [one, other] = ['a', 'b'].map((letter) => socketPath(`/home/${letter.repeat(100)}`));
		expect(one.startsWith(tmpdir())).toBe(true);
		expect(Buffer.byteLength(one)).toBeLessThanOrEqual(100);
		expect(one).not.toBe(other);
	});

	it('counts bytes, not letters', () => {
		expect(socketPath(`/home/${'ü'.repeat(45)}`).startsWith(tmpdir())).toBe(true);
	});
});

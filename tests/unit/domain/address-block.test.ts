import { expect, it } from 'vitest';
import { addressBlock } from '$lib/server/domain/address-block';

it.each([
	['192.0.2.7', '192.0.2.7'],
	['::ffff:192.0.2.7', '192.0.2.7'],
	['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
	['2001:DB8:1:2::6', '2001:db8:1:2::/64'],
	['2001:db8::6', '2001:db8:0:0::/64'],
	['2001:0db8:0001:0002::1', '2001:db8:1:2::/64'],
	['::1', '0:0:0:0::/64'],
	['fe80::1%eth0', 'fe80:0:0:0::/64']
])('addressBlock(%j) is %j', (address, block) => {
	expect(addressBlock(address)).toBe(block);
});

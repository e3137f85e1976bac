/**
 * The part of a network address that counts as one visitor: an IPv4 address whole, an IPv6 address by its first
 * 64 bits, since anybody who has one has all that follow. IPv4 inside IPv6 (::ffff:a.b.c.d) counts as IPv4.
 */
export function addressBlock(address: string): string {
	const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address);
	if (mapped) return mapped[1];
	if (!address.includes(':')) return address;
	const [head, tail] = address.toLowerCase().split('%')[0].split('::');
	const before = head === '' ? [] : head.split(':');
	const after = !tail ? [] : tail.split(':');
	const zeros = tail === undefined ? 0 : Math.max(0, 8 - before.length - after.length);
	const groups = [...before, ...Array<string>(zeros).fill('0'), ...after].slice(0, 4);
	return `${groups.map((group) => group.replace(/^0+(?=.)/, '')).join(':')}::/64`;
}

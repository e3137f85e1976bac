import { deviceKinds, type DeviceKind } from '$lib/schemas/device-kind';

/** In the order they are tried: a tablet calls itself a phone or a computer too. */
const SIGNS: readonly [DeviceKind, RegExp][] = [
	['tablet', /iPad|Tablet|Android(?!.*Mobile)/],
	['phone', /Mobi|iPhone|Android/],
	['computer', /Windows NT|Macintosh|X11|CrOS/]
];

/** The kind of device behind a User-Agent header, which may be anything at all. */
export const deviceKind = (userAgent: string | null | undefined): DeviceKind =>
	SIGNS.find(([, sign]) => sign.test(userAgent ?? ''))?.[0] ?? 'unknown';

/** The kind that a record names; a word from another time is unknown. */
export const asDeviceKind = (word: string): DeviceKind =>
	deviceKinds.find((kind) => kind === word) ?? 'unknown';

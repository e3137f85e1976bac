/** What a browser says it runs on, as far as a person needs it to tell one session from another. */
export const deviceKinds = ['computer', 'phone', 'tablet', 'unknown'] as const;

export type DeviceKind = (typeof deviceKinds)[number];

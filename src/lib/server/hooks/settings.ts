import { parseEnv, type Env } from '$lib/server/env';

let settings: Env | undefined;

/** This process's settings, read at the first request: the build loads this file where there are none. */
export const readSettings = (): Env => (settings ??= parseEnv(process.env));

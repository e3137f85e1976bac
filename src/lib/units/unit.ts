/** Units that readings, truths and findings state, all in base form: Hz, never MHz. */
export const units = ['dBm', 'dBm/Hz', 'dB', 'dBc', 'dBc/Hz', 'Hz', 's', '%', '1'] as const;
export type Unit = (typeof units)[number];

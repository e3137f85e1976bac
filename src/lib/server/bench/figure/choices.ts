/** What a figure's controls can stand at, and the settings that come of it. */
import type { ControlSetting, Figure, FigureChoice } from '$lib/schemas/figure';
import type { Settings } from '$lib/schemas/settings';

/** One choice for each control, in the order of the controls. */
export type FigureValues = readonly FigureChoice[];

/** What `settings` say of a control's setting, as typed; undefined where they say nothing. */
export function valueOf(settings: Settings, setting: ControlSetting): FigureChoice | undefined {
	switch (setting) {
		case 'padDb':
		case 'dcBlock':
		case 'connected':
			return settings.input?.[setting];
		case 'traceMode':
			return settings.traces?.[0].mode;
		default:
			return settings[setting] as FigureChoice | undefined;
	}
}

/** `settings` with one of them turned to `value`, which may yet be one that no receiver takes. */
function turned(settings: Settings, setting: ControlSetting, value: FigureChoice): Settings {
	switch (setting) {
		case 'padDb':
		case 'dcBlock':
		case 'connected':
			return { ...settings, input: { ...settings.input, [setting]: value } };
		case 'traceMode': {
			const [first, ...others] = settings.traces ?? [{ mode: 'live' }];
			return { ...settings, traces: [{ ...first, mode: value as typeof first.mode }, ...others] };
		}
		default:
			return { ...settings, [setting]: value };
	}
}

/** The figure's settings with its controls at `values`. */
export const settingsAt = (figure: Figure, values: FigureValues): Settings =>
	figure.controls.reduce((settings, { setting }, i) => turned(settings, setting, values[i]), figure.settings);

/** Where the controls stand at first: at what the settings say, else at the first choice. */
export const startValues = ({ controls, settings }: Pick<Figure, 'controls' | 'settings'>): FigureChoice[] =>
	controls.map(({ setting, choices }) => valueOf(settings, setting) ?? choices[0]);

/** Everything that the controls together can stand at. */
export const allValues = ({ controls }: Pick<Figure, 'controls'>): FigureChoice[][] =>
	controls.reduce<FigureChoice[][]>(
		(sets, { choices }) => sets.flatMap((set) => choices.map((choice) => [...set, choice])),
		[[]]
	);

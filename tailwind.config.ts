import forms from '@tailwindcss/forms';
import typography from '@tailwindcss/typography';
import type { Config } from 'tailwindcss';

/** Every colour of the drawing office, by its token in app.css, which switches between day and night. */
const colours = Object.fromEntries(
	[
		...['paper', 'sheet', 'desk', 'ink', 'pencil', 'line', 'rule', 'grid'],
		...['act', 'act-deep', 'act-edge', 'on-act', 'madder', 'madder-deep', 'madder-wash'],
		...['verdigris', 'verdigris-wash', 'ochre', 'ochre-ink', 'ochre-wash', 'blue', 'blue-wash', 'plum']
	].map((name) => [name, `var(--${name})`])
);

export default {
	content: ['./src/**/*.{html,svelte,ts}'],
	theme: {
		colors: { ...colours, transparent: 'transparent', current: 'currentColor' },
		fontFamily: { text: 'var(--face-text)', figures: 'var(--face-figures)' },
		fontSize: {
			hero: ['3.25rem', { lineHeight: '1.06', letterSpacing: '-0.028em', fontWeight: '600' }],
			lesson: ['2.25rem', { lineHeight: '1.15', letterSpacing: '-0.018em' }],
			title: ['1.625rem', { lineHeight: '1.18', letterSpacing: '-0.012em' }],
			answer: ['1.375rem', { lineHeight: '1.3' }],
			caption: ['1.25rem', { lineHeight: '1.25' }],
			base: ['1rem', { lineHeight: '1.5' }],
			brief: ['0.9375rem', { lineHeight: '1.5' }],
			row: ['0.875rem', { lineHeight: '1.45' }],
			note: ['0.8125rem', { lineHeight: '1.45' }],
			unit: ['0.75rem', { lineHeight: '1.4' }]
		},
		fontWeight: { normal: '400', medium: '570', semibold: '620', bold: '650' },
		borderRadius: { none: '0', sm: '2px', DEFAULT: '3px' },
		boxShadow: { none: 'none', float: 'var(--float-shadow)' },
		screens: { sm: '40rem', md: '60rem', lg: '73.75rem', xl: '85rem' },
		extend: {
			typography: {
				DEFAULT: {
					css: {
						'--tw-prose-body': 'var(--ink)',
						'--tw-prose-headings': 'var(--ink)',
						'--tw-prose-links': 'var(--ink)',
						'--tw-prose-bold': 'var(--ink)',
						'--tw-prose-counters': 'var(--pencil)',
						'--tw-prose-bullets': 'var(--line)',
						'--tw-prose-hr': 'var(--rule)',
						'--tw-prose-quotes': 'var(--ink)',
						'--tw-prose-quote-borders': 'var(--line)',
						'--tw-prose-captions': 'var(--pencil)',
						'--tw-prose-code': 'var(--ink)',
						'--tw-prose-th-borders': 'var(--line)',
						'--tw-prose-td-borders': 'var(--rule)',
						maxWidth: '66ch',
						lineHeight: '1.55'
					}
				}
			}
		}
	},
	plugins: [forms({ strategy: 'class' }), typography]
} satisfies Config;

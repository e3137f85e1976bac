/** Mistakes about skirts, spurs and ratios to noise: what theory says of each is what the bench gives when it is made there. */
import { promiseOfMistakes } from '../../../factories/promise-of-mistakes';

promiseOfMistakes([
	['skirts-of-a-synthesiser', 2, 'phase-noise', 'own-phase-noise', 'high'],
	['skirts-of-a-synthesiser', 2, 'phase-noise', 'skirt-of-the-filter 10000', 'high'],
	['skirts-of-a-synthesiser', 2, 'phase-noise', 'not-per-width', 'high'],
	['spur-inside-a-skirt', 2, 'difference', 'spur-under-skirt 3000', 'high'],
	['beacon-over-its-noise', 2, 'ratio', 'floor-in-ratio 20', 'low'],
	['beacon-over-its-noise', 2, 'ratio', 'not-per-width', 'high'],
	['beacon-over-its-noise', 2, 'ratio', 'other-noise-width 250000', 'low']
]);

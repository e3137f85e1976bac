import { getFrontFigure } from '$lib/server/services/bench/get-front-figure';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = () => ({ figure: getFrontFigure() });

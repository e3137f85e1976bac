import type { Figure, FigureChoice } from '$lib/schemas/figure';
import type { FigureRequest, FigureState } from '$lib/schemas/figure-view';
import { Unit } from '$lib/server/db/models/unit';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';
import type { Limit } from '$lib/server/domain/sign-in-limit';
import { DomainError, type Issue } from '$lib/server/errors';
import { ShareByAddress } from '../process/share-by-address';
import { figureState } from './figure-states';

/** Figures made for one address. What is made already costs nothing. */
export const FIGURE_LIMIT: Limit = { capacity: 120, drainS: 0.5 };

const figuresMade = new ShareByAddress('figures', FIGURE_LIMIT);

/**
 * A lesson's figure with its controls where the reader put them.
 * @param unitId of any edition
 * @param address network address that asks
 * @throws DomainError `not_found`; `invalid` naming the control whose value is not among its choices; `too_many`
 */
export async function turnFigure(
	actor: Actor,
	{ unitId, figureId, address }: { unitId: number; figureId: string; address: string },
	{ values }: FigureRequest,
	now: Date
): Promise<FigureState> {
	refuseUnless(actor, 'lesson.read');
	const unit = await Unit.findByPk(unitId, { attributes: ['id', 'figures'] });
	const figure = unit?.figures.find(({ id }) => id === figureId);
	if (!figure) throw new DomainError('not_found', 'There is no such figure.');
	return figureState({ unitId, figure }, chosen(figure, values), () => figuresMade.spend(address, now));
}

/** One choice for each control, as asked; @throws DomainError for one that isn't offered */
function chosen({ controls }: Figure, values: FigureRequest['values']): FigureChoice[] {
	const known = new Set<string>(controls.map(({ setting }) => setting));
	const issues: Issue[] = [
		...Object.keys(values)
			.filter((key) => !known.has(key))
			.map((key) => ({ field: `values.${key}`, message: 'is no control of this figure' })),
		...controls
			.filter(({ setting, choices }) => !Object.hasOwn(values, setting) || !choices.includes(values[setting]))
			.map(({ setting, choices }) => ({
				field: `values.${setting}`,
				message: `must be one of ${choices.map(String).join(', ')}`
			}))
	];
	if (issues.length > 0) throw new DomainError('invalid', 'The figure can’t be set like that.', { issues });
	return controls.map(({ setting }) => values[setting]);
}

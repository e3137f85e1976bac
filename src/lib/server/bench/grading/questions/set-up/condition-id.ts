import type { Condition } from '$lib/schemas/questions/condition';

/** A condition's name among the others: its own, else its setting, else its kind. */
export const conditionId = (condition: Pick<Condition, 'kind' | 'id'>): string =>
	condition.id ?? ('setting' in condition ? String(condition.setting) : condition.kind);

import type { Condition } from '$lib/schemas/questions/condition';
import type { DrawnCondition } from '$lib/server/bench/exercise/drawn-exercise';
import type { Scope } from '$lib/server/bench/exercise/expression';
import { fillTemplate } from '$lib/server/bench/exercise/fill-template';
import { conditionId } from './condition-id';

/** Conditions with the numbers of one draw. @throws BenchError naming the entry that can't be evaluated */
export const fillConditions = (
	conditions: readonly Condition[],
	scope: Scope,
	field: string
): DrawnCondition[] =>
	conditions.map((condition, i) => ({
		...(fillTemplate(condition, scope, `${field}[${i}]`) as DrawnCondition),
		id: conditionId(condition)
	}));

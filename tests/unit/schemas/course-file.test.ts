import { describe, expect, it } from 'vitest';
import { courseFile } from '$lib/schemas/course-file';

const unit = (number: number, over: Record<string, unknown> = {}) => ({
	...{ number, slug: `unit-${number}`, title: 'T', summary: 'S', exercises: [`exercise-${number}`] },
	...over
});
const issueOf = (...units: unknown[]) => {
	const { error } = courseFile.safeParse({ slug: 'c', title: 'T', summary: 'S', units });
	const issue = error?.issues.at(0);
	return issue && `${issue.path.join('.')}: ${issue.message}`;
};

describe('courseFile', () => {
	it('lets a unit need those that stand before it, and be done with fewer exercises than it has', () => {
		expect(issueOf(unit(1, { doneWith: 1 }), unit(2, { needs: ['unit-1'] }))).toBeUndefined();
	});

	it('refuses a need that stands later, that is the unit itself, that isn’t there, or that can’t be done', () => {
		expect(issueOf(unit(1, { needs: ['unit-2'] }), unit(2))).toContain('units.0.needs.0: unit-2 is no unit');
		expect(issueOf(unit(1, { needs: ['unit-1'] }))).toContain('units.0.needs.0');
		expect(issueOf(unit(1), unit(2, { needs: ['nothing'] }))).toContain('units.1.needs.0');
		expect(issueOf(unit(1, { exercises: [] }), unit(2, { needs: ['unit-1'] }))).toContain('can’t be done');
	});

	it('refuses a unit that is done with more exercises than it has', () => {
		expect(issueOf(unit(1, { doneWith: 2 }))).toContain('units.0.doneWith: the unit has only 1');
	});
});

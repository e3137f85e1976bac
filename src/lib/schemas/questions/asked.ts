/** What every question has, whatever it asks for. */
import { line, slug } from './words';

export const asked = {
	id: slug,
	text: line,
	/** The skill it shows, by the slug of the unit that teaches it; the exercise's own unit unless it says so. */
	skill: slug.optional()
};

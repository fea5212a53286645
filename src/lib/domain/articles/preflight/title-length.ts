import type { Check } from './finding';

/** Common practice, no source: longer titles are cut in lists, feeds and search results. */
const longest = 80;

/** The title fits where it is shown. */
export const titleLength: Check = ({ title }) =>
	title.length > longest
		? [
				{
					check: 'title-length',
					severity: 'advice',
					message: `The title has ${title.length} characters.`,
					mend: `Past ${longest} it is cut in lists and feeds. Say the rest in the standfirst.`,
					place: { kind: 'title' }
				}
			]
		: [];

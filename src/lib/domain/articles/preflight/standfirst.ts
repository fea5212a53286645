import type { Check } from './finding';

/** The article has a standfirst: it stands under the title, in lists and in the feed. */
export const standfirst: Check = ({ standfirst: words }) =>
	words.trim() === ''
		? [
				{
					check: 'standfirst',
					severity: 'advice',
					message: 'There is no standfirst.',
					mend: 'Say in a sentence or two what readers learn: it stands under the title, in lists and in the feed.',
					place: { kind: 'standfirst' }
				}
			]
		: [];

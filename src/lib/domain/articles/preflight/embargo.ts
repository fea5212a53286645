import { slotWords } from '../slot';
import type { Check } from './finding';

const covers = {
	specification: 'its specification',
	results: 'results of it',
	everything: 'anything about it'
};

/** No embargo ends after the moment of print. While there is no slot, one that still stands is named as advice. */
export const embargo: Check = ({ data, printAt, now }) => {
	const at = printAt ?? now;
	return data.duties.flatMap(({ partName, sample, embargoes }) =>
		embargoes
			.filter(({ until }) => new Date(until).getTime() > at.getTime())
			.map(({ field, until }) => ({
				check: 'embargo',
				severity: printAt ? ('blocking' as const) : ('advice' as const),
				message: `The embargo on ${partName} (${sample}) holds ${covers[field]} back until ${slotWords(new Date(until), data.zone)}.`,
				mend: printAt
					? 'Choose a slot at that time or after it, or ask the liaison whether it can be lifted.'
					: 'Choose a slot at that time or after it.',
				place: { kind: 'slot' as const }
			}))
	);
};

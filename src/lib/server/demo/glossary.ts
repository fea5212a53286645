import { termInput } from '../../schemas/glossary';
import { createTerm } from '../services/articles/write-term';
import type { Act, World } from './act';
import type { Who } from './staff';

const terms: [who: Who, term: string, aliases: string, explanation: string][] = [
	[
		'Ines',
		'boost',
		'automatic boost, boosting',
		'A clock above the rated one, which the board holds for as long as heat, power and current allow it.'
	],
	[
		'Ines',
		'fixed clock',
		'all-core clock',
		'One clock for all cores, whatever the load. It holds through long work, and takes away what one core alone could reach.'
	],
	[
		'Ines',
		'switch point',
		'',
		'The current at which a board changes over from automatic boost to a fixed clock.'
	],
	[
		'Ines',
		'power limit',
		'power limits',
		'How much power the board or the driver lets a part draw before it takes the clock back.'
	],
	[
		'Marit',
		'95 % interval',
		'interval, intervals',
		'A range around a measured value that shows how sure it is. Measured anew again and again, about 95 of 100 such ranges would hold the true value.'
	],
	[
		'Marit',
		'least difference that matters',
		'band of no difference',
		'How far two results must lie apart before anybody would notice in use. We fix it for each test before we measure.'
	],
	[
		'Noor',
		'median',
		'',
		'The middle one of all readings, set in order. A single odd reading does not move it.'
	],
	[
		'Noor',
		'memory controller',
		'controller',
		'The part of the processor that talks to the memory. Its clock runs in step with the memory’s, or at half of that.'
	],
	['Noor', 'sone', '', 'A measure of loudness as it is heard: twice the sone sounds twice as loud.']
];

/** The words that the lab explains to its readers, written down before the first article that names one. */
export const glossaryActs = ({ calendar }: World): Act[] =>
	terms.map(([who, term, aliases, explanation], at) => ({
		at: calendar.at(-41, `11:${String(10 + at)}`),
		who,
		what: `the term ${term}`,
		run: (ctx) => createTerm(ctx, termInput.parse({ term, aliases, explanation }))
	}));

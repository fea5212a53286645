import { unitOf } from '../../shared/units';
import type { WorkloadFacts } from '../../bench/figures';

/** What a claim of direction says: of which quantity, and which way. */
export interface Saying {
	pattern: RegExp;
	/** The way it says things go for the quantity: better or worse, its number up or down, or no difference. */
	way: 'better' | 'worse' | 'lower' | 'higher' | 'same' | 'not-better' | 'not-worse';
	/** Which workloads it can be about. */
	about: 'speed' | 'temperature' | 'sound' | 'power' | 'energy' | 'price' | 'any';
}

/** What may stand before the word and belongs to it. */
const degree =
	/(?:a (?:little|bit|touch|shade|hair)|slightly|much|far|clearly|noticeably|considerably|even|a lot|not any|not|no|any|never) $/i;

/** Where a saying begins, the words of degree before it included. */
function withDegree(text: string, from: number): number {
	const before = degree.exec(text.slice(Math.max(0, from - 16), from));
	const start = before ? from - before[0].length : from;
	return before && /\p{L}/u.test(text.charAt(start - 1)) ? from : start;
}

const saying = (words: string, way: Saying['way'], about: Saying['about']): Saying => ({
	pattern: new RegExp(`(?<![\\w-])(?:${words})(?![\\w-])`, 'gi'),
	way,
	about
});

/** Words that say which way something goes, without a number. */
const sayings: readonly Saying[] = [
	saying(
		'no (?:gain|benefit|advantage|improvement|speed-?up)(?: (?:worth naming|to speak of|at all|whatever))?|gains? nothing|gained nothing|wins? nothing|brings nothing|buys nothing',
		'not-better',
		'any'
	),
	saying('no (?:loss|penalty)|loses? nothing|lost nothing|costs? nothing', 'not-worse', 'any'),
	saying(
		'no (?:real |measurable )?difference(?: that matters)?|the same(?= (?:speed|time|rate|as|either|with|under|in both|for both)|[.,;]|$)|no (?:different|change)|unchanged|indistinguishable|as (?:fast|quick|cool|quiet|loud|hot) as|just as (?:fast|quick|cool|quiet|loud|hot)|does not (?:change|move|differ)|equally (?:fast|quick|cool|quiet|loud|hot)|on a par|neither faster nor slower',
		'same',
		'any'
	),
	saying('faster|quicker|sped up|speeds up', 'better', 'speed'),
	saying('slower|slows down|slowed down', 'worse', 'speed'),
	saying('cooler', 'lower', 'temperature'),
	saying('hotter|warmer', 'higher', 'temperature'),
	saying('quieter', 'lower', 'sound'),
	saying('louder|noisier', 'higher', 'sound'),
	saying('more efficient|more frugal', 'better', 'energy'),
	saying('less efficient', 'worse', 'energy'),
	saying('draws? less(?: power)?|uses? less power|less power', 'lower', 'power'),
	saying('draws? more(?: power)?|uses? more power|more power', 'higher', 'power'),
	saying('uses? less energy|less energy', 'lower', 'energy'),
	saying('uses? more energy|more energy', 'higher', 'energy'),
	saying('cheaper', 'lower', 'price'),
	saying('dearer|more expensive', 'higher', 'price'),
	saying('better', 'better', 'any'),
	saying('worse', 'worse', 'any'),
	saying(
		'(?<=\\b(?:is|are|was|were|gets?|falls?|comes?|stays?|sits?) (?:\\w+ )?)(?:lower|shorter)',
		'lower',
		'any'
	),
	saying(
		'(?<=\\b(?:is|are|was|were|gets?|rises?|comes?|stays?|sits?) (?:\\w+ )?)(?:higher|longer)',
		'higher',
		'any'
	),
	saying('gains|improves|wins', 'better', 'any'),
	saying('loses|suffers', 'worse', 'any')
];

const soundWords = /\b(?:loud|noise|sound)/i;
const warmWords = /\b(?:temperature|heat|thermal|warm)/i;

/** Whether words of one sort can be said of a workload at all. */
export function fitsAbout(
	workload: Pick<WorkloadFacts, 'unit' | 'quantity' | 'name'>,
	about: Saying['about']
): boolean {
	const kind = unitOf(workload.unit)?.kind;
	const said = `${workload.quantity} ${workload.name}`;
	const isSound = kind === 'sound' || /^sones?$/.test(workload.unit) || soundWords.test(said);
	const isWarm = kind === 'temperature' || warmWords.test(workload.quantity);
	switch (about) {
		case 'any':
			return true;
		case 'price':
			return false;
		case 'sound':
			return isSound;
		case 'temperature':
			return isWarm;
		case 'power':
			return kind === 'power';
		case 'energy':
			return kind === 'energy' || kind === 'power' || /efficien|per watt/i.test(said);
		case 'speed':
			return (
				!isSound &&
				!isWarm &&
				kind !== 'power' &&
				kind !== 'energy' &&
				kind !== 'voltage' &&
				kind !== 'current'
			);
	}
}

/** Looked for first, since most passages say nothing of the kind. */
const likely =
	/gain|benefit|advantage|improve|speed|win|bring|buy|lose|loss|lost|penalty|cost|differ|same|change|as (?:fast|quick|cool|quiet|loud|hot)|equal|on a par|neither|er\b|more|less|worse|draws|uses|suffer/i;

/** Every place where a passage says a direction; longer words win over those inside them. */
export function sayingsIn(text: string): { from: number; to: number; saying: Saying }[] {
	const found: { from: number; to: number; saying: Saying }[] = [];
	if (!likely.test(text)) return found;
	for (const saying of sayings)
		for (const match of text.matchAll(saying.pattern)) {
			const [from, to] = [withDegree(text, match.index), match.index + match[0].length];
			if (!found.some((one) => one.from < to && one.to > from)) found.push({ from, to, saying });
		}
	return found.sort((a, b) => a.from - b.from);
}

import type { BenchFacts } from './bench-facts';
import type { Saying } from './direction-words';
import { judged, type Judged } from './judged';
import { overallWords } from './judge-percent';
import { linkOf, overOf, type Surroundings } from './scope';

/** “Faster overall”: held against the interval of the overall gain, which has no verdict of its own. */
export function judgeOverall({ way }: Saying, s: Surroundings, facts: BenchFacts): Judged | null {
	const sentence = s.passage.text.slice(s.sentence.from, s.sentence.to);
	if ((way !== 'better' && way !== 'worse') || !overallWords.test(sentence)) return null;
	const profile = linkOf('profile', s);
	if (profile.hold !== 'clause' && profile.hold !== 'sentence') return null;
	const [over = null] = overOf(s);
	const datum = facts.overalls(over).find((one) => profile.slugs.includes(one.profile ?? ''));
	if (!datum?.interval) return null;
	const [low, high] = datum.interval;
	if (low <= 0 && high >= 0) return judged('more-than-data', datum, 'Its interval has both ways in it.');
	const right = way === 'better' ? low > 0 : high < 0;
	return right ? judged('agrees', datum) : judged('contradicts', datum, 'It goes the other way.');
}

/** “Cheaper than”: the first part named against the second, by the prices seen. */
export function judgeCheaper({ way }: Saying, s: Surroundings, facts: BenchFacts): Judged | null {
	const sentence = s.passage.text.slice(s.sentence.from, s.sentence.to).toLowerCase();
	const named = facts.prices
		.map((datum) => ({ datum, at: sentence.indexOf((datum.called ?? '').toLowerCase()) }))
		.filter(({ at }) => at >= 0)
		.sort((a, b) => a.at - b.at);
	const [one] = named;
	const two = named.find(({ datum }) => datum.called !== one?.datum.called);
	if (!one || !two || one.datum.unit !== two.datum.unit) return null;
	const why = `${two.datum.name}: ${two.datum.printed}.`;
	if (one.datum.value === two.datum.value) return judged('contradicts', one.datum, why);
	const lower = one.datum.value < two.datum.value;
	return judged(lower === (way === 'lower') ? 'agrees' : 'contradicts', one.datum, why);
}

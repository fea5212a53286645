import { agrees, roundsTo, sizeRoundsTo, type Decimal } from './decimal';
import type { Datum, Held } from './datum';
import { clearlyMeant, gaining, judged, nearestTo, tiers, type Case, type Judged } from './judged';
import { words } from './scope';
import { senseOf, type Sense } from './sense';
import { printedGain } from '../../shared/quantity';

/** Says that all workloads together are meant. */
export const overallWords =
	/\b(?:overall|on average|geometric mean|over everything|across (?:all|everything|the board)|all workloads|taken together|taken over|in all|every workload|over all)\b/i;

const changeOf = (one: Held): number => (one.quotient - 1) * 100;

/** Whether a printed percentage, with the way it is said to go, is a stored one. */
function fits(stored: number, printed: Decimal, { figure }: Case, sign: 1 | -1 | null): boolean {
	const said = figure.sign ?? sign;
	if (said === null) return agrees(Math.abs(stored), printed, figure.hedge);
	return agrees(stored, { ...printed, value: said * Math.abs(printed.value) }, figure.hedge);
}

interface Match {
	datum: Held;
	/** As the other of gain and change than the words say. */
	turned: boolean;
}

/** The gain or change that a percentage is, by what its words mean; null where none rounds to it. */
function find(pool: readonly Held[], of: Case, sense: Sense): Match | null {
	const [printed] = of.figure.readings;
	if (!printed) return null;
	const asRate = pool.find((one) => fits(one.value, printed, of, sense.sign));
	const asChange = pool.find((one) => one.lowerIsBetter && fits(changeOf(one), printed, of, sense.sign));
	if (sense.of === 'quantity') {
		const plain = pool.find((one) => fits(changeOf(one), printed, of, sense.sign));
		return plain ? { datum: plain, turned: false } : null;
	}
	if (asRate) return { datum: asRate, turned: false };
	return asChange && sense.of === null ? { datum: asChange, turned: false } : null;
}

/** A stored interval whose ends are the ends of a printed range, or a value within the range. */
function inRange(pool: readonly Held[], { figure: { readings, high, sign } }: Case): Held | null {
	const [low] = readings;
	if (!low || !high) return null;
	const asInterval = pool.find(
		({ interval }) =>
			interval &&
			((roundsTo(interval[0], low) && roundsTo(interval[1], high)) ||
				(sizeRoundsTo(interval[0], low) && sizeRoundsTo(interval[1], high)) ||
				(sizeRoundsTo(interval[1], low) && sizeRoundsTo(interval[0], high)))
	);
	if (asInterval) return asInterval;
	const within = (value: number) => value >= low.value * (sign ?? 1) && value <= high.value;
	return (
		pool.find(
			(one) => within(Math.abs(one.value)) || sizeRoundsTo(one.value, low) || sizeRoundsTo(one.value, high)
		) ?? null
	);
}

const wrongWay = (datum: Held): string => {
	const time = changeOf(datum);
	return `${printedGain(time)} of the quantity is ${printedGain(datum.value)} of the rate; where less is better the two are not the same.`;
};

/** The printed percentage with its size right and its sign, or its sense, wrong. */
function mistaken(pool: readonly Held[], of: Case, sense: Sense): Judged | null {
	const [printed] = of.figure.readings;
	if (!printed) return null;
	const other = pool.find((one) =>
		sense.of === 'quantity'
			? one.lowerIsBetter && sizeRoundsTo(one.value, printed)
			: one.lowerIsBetter && sizeRoundsTo(changeOf(one), printed)
	);
	if (other && sense.of !== null) return judged('contradicts', other, wrongWay(other), 'wrong-way');
	const against = pool.find((one) =>
		sizeRoundsTo(sense.of === 'quantity' ? changeOf(one) : one.value, printed)
	);
	return against ? judged('contradicts', against, 'It goes the other way.') : null;
}

const rising = (stored: Held, sense: Sense): number =>
	sense.of === 'quantity' ? changeOf(stored) : stored.value;

/** Percentages that are settings, derived facts, spreads or protocol: only where their names stand near. */
function plainShares({ figure, facts, s, profile, workload, settings }: Case): Datum | null {
	const [printed] = figure.readings;
	if (!printed) return null;
	const clause = words(s.passage.text.slice(s.clause.from, s.clause.to));
	const spread = /\b(?:spread|scatter|variation|deviation|vary|varies|varied|repeat(?:s|ability)?)\b/i.test(
		clause
	);
	const share = (one: Datum) => one.unit === '%' && roundsTo(one.value, printed);
	if (spread) {
		const found = facts.readings.filter((one) => one.kind === 'spread' && share(one));
		return found.find((one) => workload.slugs.includes(one.workload ?? '')) ?? found[0] ?? null;
	}
	const known = facts.others.filter(share);
	const called = known.find((one) => one.called !== null && settings.names.includes(one.called));
	if (called) return called;
	const method = facts.methods.find(share);
	if (method && /\b(?:matter|differences?|least|threshold|band)\b/i.test(clause)) return method;
	return workload.hold === 'clause' || workload.hold === 'sentence'
		? null
		: (known.find((one) => profile.slugs.includes(one.profile ?? '')) ?? null);
}

/** A gain of one of the sentence's profiles over another, where the sentence does not say which over which. */
function betweenNamed(of: Case, sense: Sense): Held | null {
	const { facts, near, workload } = of;
	const pool = near.profiles
		.flatMap((over) => facts.gains(over))
		.filter(
			(one) => near.profiles.includes(one.profile ?? '') && workload.slugs.includes(one.workload ?? '')
		);
	return find(pool, of, sense)?.datum ?? null;
}

/** A percentage held against gains, overall gains, and what else is in percent. */
export function judgePercent(given: Case): Judged {
	const of = gaining(given);
	const { figure, s, facts, over } = of;
	const [printed] = figure.readings;
	if (!printed) return judged('not-backed');
	const said = senseOf(words(s.passage.text), figure, s.clause);
	// A number with a sign of its own and no word beside it may be either.
	const sense: Sense = figure.sign !== null && said.sign === null ? { of: null, sign: null } : said;
	const sentence = s.passage.text.slice(s.sentence.from, s.sentence.to);
	const clause = s.passage.text.slice(s.clause.from, s.clause.to);
	const isOverall =
		overallWords.test(of.workload.hold === 'clause' ? clause : sentence) &&
		!(of.workload.hold === 'clause' && !overallWords.test(clause));
	const other = plainShares(of);
	if (other && (other.kind === 'spread' || of.workload.hold !== 'clause')) return judged('agrees', other);
	const all = isOverall
		? over.flatMap((one) => facts.overalls(one))
		: over.flatMap((one) => facts.gains(one));
	const found = tiers(all, isOverall ? { ...of, workload: { slugs: [], hold: 'none' } } : of);
	if (figure.high) {
		const datum = found.map((pool) => inRange(pool, of)).find((one) => one !== null);
		if (datum) return judged('agrees', datum);
	}
	const [meant = []] = found;
	for (const pool of found) {
		const match = figure.high ? null : find(pool, of, sense);
		if (match) return judged('agrees', match.datum);
		// A number that would fit something less surely meant is still the wrong one for what is named.
		if (pool === meant) {
			const wrong = figure.high || meant.length === 0 ? null : mistaken(meant, of, sense);
			if (wrong && (isOverall || clearlyMeant(of, meant))) return wrong;
			if (of.workload.hold === 'clause' && of.profile.hold === 'clause') break;
		}
	}
	if (other) return judged('agrees', other);
	const between = found.length > 0 && of.near.profiles.length > 1 ? betweenNamed(of, sense) : null;
	if (between) return judged('agrees', between);
	const nearest = nearestTo(meant, Math.abs(printed.value), (one) => rising(one, sense));
	const clear = isOverall ? of.profile.hold !== 'none' && meant.length === 1 : clearlyMeant(of, meant);
	return judged(clear && nearest ? 'contradicts' : 'not-backed', nearest);
}

const pointsWhy = (text: string): string =>
	`${text} is a percentage. Percentage points are the difference of two percentages: 40 % to 50 % is 10 points, and 25 %.`;

/** Percentage points held against the differences of gains; a gain put in points is told apart. */
export function judgePoints(of: Case): Judged {
	const [printed] = of.figure.readings;
	if (!printed) return judged('not-backed');
	const all = of.facts.gains(null);
	const pool = all.filter(
		(one) => of.workload.hold === 'none' || of.workload.slugs.includes(one.workload ?? '')
	);
	for (const one of pool)
		for (const two of pool)
			if (
				one !== two &&
				one.workload === two.workload &&
				one.value > two.value &&
				roundsTo(one.value - two.value, printed)
			)
				return judged('agrees', one, `${one.printed} less ${two.printed} (${two.name}).`);
	const gain = (tiers(all, of)[0] ?? []).find((one) => sizeRoundsTo(one.value, printed));
	if (gain && of.workload.hold !== 'none')
		return judged('contradicts', gain, pointsWhy(gain.printed), 'points');
	return judged('not-backed');
}

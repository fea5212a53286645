import { unitOf } from '../../shared/units';
import type { Datum } from './datum';
import { agrees, lastPlace, roundsTo, sizeRoundsTo, type Decimal } from './decimal';
import { clearlyMeant, judged, nearestTo, tiers, type Case, type Judged } from './judged';
import { words, type Link } from './scope';
import { inUnit, plainName as plain, type Turned } from './unit-change';

const comparative =
	/^(?:[\s\u00a0-]*(?:of a )?)(?:cooler|hotter|warmer|quieter|louder|faster|slower|quicker|shorter|longer|less|more|lower|higher|fewer|sooner|later|earlier|saved|above stock|over stock|below stock|better|worse|ahead|behind)\b/i;
const changed =
	/\b(?:by|sav(?:e|es|ed|ing)|gain(?:s|ed)?|los(?:e|es|t)|cuts?|adds?|difference(?: is| of)?|takes? off|shaves?(?: off)?|brings?|costs?)\s*(?:about|around|nearly|over|almost|some|only|just)?\s*$/i;

/** Whether a number with a unit says how far two readings lie apart. */
export const isDifference = ({ figure, s }: Case): boolean => {
	const text = words(s.passage.text);
	return (
		comparative.test(text.slice(figure.to, figure.to + 24)) ||
		changed.test(text.slice(Math.max(s.clause.from, figure.from - 28), figure.from)) ||
		/\bdifference\b[^,;.]*\b(?:is|was|comes to|of)\s*$/i.test(text.slice(s.sentence.from, figure.from))
	);
};

/** The digits a datum is printed with: where its interval is wide they end in noughts that say nothing. */
const digitsOf = ({ printed, unit }: Datum): string =>
	(unit !== '' && printed.endsWith(unit) ? printed.slice(0, -unit.length) : printed)
		.replace(/[\s\u00a0+]/g, '')
		.replace('\u2212', '-');

function fits({ value, datum }: Turned, of: Case, bySize: boolean): boolean {
	const { readings, high, margin, hedge, sign } = of.figure;
	const halfWidth = datum.interval ? (datum.interval[1] - datum.interval[0]) / 2 : null;
	const scale = datum.value === 0 ? 1 : value / datum.value;
	if (margin && !(halfWidth !== null && roundsTo(halfWidth * scale, margin))) return false;
	if (readings.length === 0) return margin !== null;
	return readings.some((printed) => {
		if (scale === 1 && printed.text === digitsOf(datum)) return true;
		if (high) {
			const ends = datum.interval?.map((end) => end * scale) ?? [];
			const asInterval = roundsTo(ends[0] ?? NaN, printed) && roundsTo(ends[1] ?? NaN, high);
			return (
				asInterval ||
				(value >= printed.value && value <= high.value) ||
				roundsTo(value, printed) ||
				roundsTo(value, high)
			);
		}
		if (bySize) return agrees(Math.abs(value), printed, hedge);
		return agrees(value, { ...printed, value: (sign ?? 1) * printed.value }, hedge);
	});
}

/** A round number such as 4700 where the bench has 4687: right to its noughts, and not to its ones. */
const isRounded = (value: number, printed: Decimal): boolean => {
	const place = lastPlace(printed);
	const digits = printed.text.replace(/\D/g, '').length;
	return (
		place > 0 &&
		printed.places === 0 &&
		digits - place > 1 &&
		sizeRoundsTo(value, { ...printed, places: -place })
	);
};

const introduced =
	/^\s*(?:(?:and|or)\s+)?(?:from|instead of|rather than|against|versus|compared (?:with|to)|down from|up from)\b/i;

/** The profile of a reading: that of its clause, unless the clause is what something is held against. */
function profileOf(of: Case): Link {
	const { s, profile, over, facts } = of;
	const lead = introduced.test(s.passage.text.slice(s.clause.from, of.figure.from));
	if (!lead || profile.hold === 'clause') return profile;
	const named = over.filter((one) => one !== null);
	const baselines = facts.data.campaigns.map((one) => one.baseline);
	return { slugs: [...new Set([...named, ...baselines])], hold: 'sentence' };
}

/** A setting, derived fact, ambient or price that a number with a unit is. */
function ofOthers(of: Case, unit: string): { agreed: Datum | null; named: Turned[] } {
	const all = inUnit(of.facts.others, unit);
	const called = all.filter(({ datum }) => datum.called !== null && of.settings.names.includes(datum.called));
	const named =
		of.profile.hold === 'none'
			? called
			: called.filter(({ datum }) => of.profile.slugs.includes(datum.profile ?? ''));
	const fitting = (pool: Turned[]) => pool.find((one) => fits(one, of, false))?.datum ?? null;
	const ofProfile = all.filter(({ datum }) => of.profile.slugs.includes(datum.profile ?? ''));
	const sure = called.length > 0 && of.settings.hold === 'clause';
	const methods = inUnit(of.facts.methods, unit);
	const agreed = sure
		? fitting(named)
		: (fitting(named) ??
			fitting(ofProfile) ??
			fitting(methods.filter(({ datum }) => of.near.workloads.includes(datum.workload ?? ''))) ??
			fitting(all) ??
			fitting(methods));
	return { agreed, named: named.length > 0 ? named : called };
}

const roomWords = /\b(?:room|ambient|intake|air)\b/i;

/** What is not a power but an energy, or the other way round, with the same digits. */
function energyTrap(of: Case, unit: string): Judged | null {
	const kind = unitOf(plain(unit))?.kind;
	if (kind !== 'power' && kind !== 'energy') return null;
	const other = of.facts.readings.find(
		(one) =>
			unitOf(plain(one.unit))?.kind === (kind === 'power' ? 'energy' : 'power') &&
			of.workload.slugs.includes(one.workload ?? '') &&
			(of.figure.readings[0] ? roundsTo(one.value, of.figure.readings[0]) : false)
	);
	if (!other) return null;
	const why = `${unit} is ${kind === 'power' ? 'a power, what is drawn at a moment' : 'an energy, power over time'}; the bench has ${other.unit}, ${kind === 'power' ? 'an energy' : 'a power'}.`;
	return judged('contradicts', other, why, 'energy');
}

/** A number with a unit, held against readings, their differences, settings, derived facts and the like. */
export function judgeUnit(of: Case, unit: string): Judged {
	const { figure, facts, settings, s } = of;
	const clause = words(s.passage.text.slice(s.clause.from, s.clause.to));
	const apart = isDifference(of);
	const profile = profileOf(of);
	const ours: Case = { ...of, profile };
	const pool = apart
		? of.over.flatMap((base) => inUnit(facts.differences(base), unit))
		: inUnit(facts.averages, unit);
	const found = tiers(
		pool.map(({ datum }) => datum),
		ours
	).map((tier) => pool.filter((one) => tier.includes(one.datum)));
	const other = ofOthers(of, unit);
	const settingFirst = settings.hold === 'clause' && of.workload.hold !== 'clause' && other.named.length > 0;
	if (settingFirst) {
		if (other.agreed) return judged('agrees', other.agreed);
		const nearest = nearestTo(
			other.named.map((one) => one.datum),
			figure.readings[0]?.value ?? 0
		);
		const several = new Set(other.named.map((one) => one.value)).size > 1 && of.profile.hold === 'none';
		return judged(several ? 'not-backed' : 'contradicts', nearest);
	}
	const [meant = []] = found;
	for (const tier of found) {
		const match = tier.find((one) => fits(one, ours, apart));
		if (match) return judged('agrees', match.datum);
		if (
			tier === meant &&
			of.workload.hold === 'clause' &&
			(profile.hold === 'clause' || profile.hold === 'sentence')
		)
			break;
	}
	const value = figure.readings[0]?.value ?? 0;
	const nearest = nearestTo(
		meant.map((one) => one.datum),
		value
	);
	if (
		!apart &&
		meant.length > 0 &&
		clearlyMeant(
			ours,
			meant.map((one) => one.datum)
		)
	) {
		if (other.agreed && other.agreed.kind !== 'method' && of.workload.hold !== 'clause')
			return judged('agrees', other.agreed);
		const round = meant.find((one) => figure.readings.some((printed) => isRounded(one.value, printed)));
		if (round && !figure.high)
			return judged(
				'not-backed',
				round.datum,
				'It is rounded further than its digits say. Write “about” before it, or bind it.',
				'round-number'
			);
		return judged('contradicts', nearest);
	}
	if (
		apart &&
		meant.length > 0 &&
		clearlyMeant(
			ours,
			meant.map((one) => one.datum)
		)
	)
		return judged('contradicts', nearest);
	const trapped = energyTrap(of, unit);
	if (trapped) return trapped;
	if (other.agreed) return judged('agrees', other.agreed);
	if (roomWords.test(clause) && ['temperature'].includes(unitOf(plain(unit))?.kind ?? '')) {
		const ambient = facts.others.filter((one) => one.kind === 'ambient');
		if (ambient.length > 0) return judged('contradicts', nearestTo(ambient, value));
	}
	return judged('not-backed', nearest);
}

/** A number with no unit: a setting such as a timing, a score, or nothing that could be told. Null for what is no claim. */
export function judgeBare(of: Case): Judged | null {
	const [printed] = of.figure.readings;
	if (!printed) return null;
	const called = of.facts.others.filter(
		(one) => one.called !== null && of.settings.names.includes(one.called)
	);
	const named = called.filter(
		(one) => of.profile.hold === 'none' || of.profile.slugs.includes(one.profile ?? '')
	);
	const agreed = [...named, ...called.filter(() => of.settings.hold !== 'clause')].find((one) =>
		roundsTo(one.value, printed)
	);
	if (agreed) return judged('agrees', agreed);
	if (of.settings.hold === 'clause' && named.some((one) => one.unit === ''))
		return judged('contradicts', named[0] ?? null);
	if (printed.places <= 0) return null;
	const readings = tiers(of.facts.averages, of);
	const match = of.workload.hold === 'none' ? null : readings[0]?.find((one) => roundsTo(one.value, printed));
	return judged(match ? 'agrees' : 'not-backed', match ?? null);
}

/** A sum of money held against the prices of the kit. */
export function judgePrice(of: Case, currency: string): Judged {
	const { figure, s, facts } = of;
	const sentence = s.passage.text.slice(s.sentence.from, s.sentence.to).toLowerCase();
	const known = facts.prices.filter((one) => one.unit === currency);
	const named = known.filter((one) => sentence.includes((one.called ?? '').toLowerCase()));
	const fitting = (pool: Datum[]) =>
		pool.find((one) => figure.readings.some((printed) => agrees(one.value, printed, figure.hedge)));
	const match = fitting(named) ?? (named.length === 0 ? fitting(known) : undefined);
	if (match) return judged('agrees', match);
	const nearest = nearestTo(named, figure.readings[0]?.value ?? 0);
	return judged(nearest ? 'contradicts' : 'not-backed', nearest);
}

import type { Datum } from './datum';
import type { Figure } from './figures';
import type { BenchFacts } from './bench-facts';
import { linkOf, namedIn, overOf, settingsIn, type Link, type Surroundings } from './scope';

/** How a claim stands to the data. */
export type ClaimState = 'bound' | 'agrees' | 'contradicts' | 'more-than-data' | 'not-backed';

export const stateWords: Record<ClaimState, string> = {
	bound: 'Bound',
	agrees: 'Agrees',
	contradicts: 'Contradicts the bench',
	'more-than-data': 'Says more than the data',
	'not-backed': 'Not backed'
};

/** A way of putting it that readers understand in two ways, or wrongly. */
export type Trap = 'points' | 'times-faster' | 'wrong-way' | 'energy' | 'round-number' | 'better-way';

/** What was found out about a claim. */
export interface Judged {
	state: ClaimState;
	/** The datum that is meant, or the nearest. */
	datum: Datum | null;
	/** A sentence beyond the datum, where there is more to say. */
	why: string;
	trap: Trap | null;
}

export const judged = (
	state: ClaimState,
	datum: Datum | null = null,
	why = '',
	trap: Trap | null = null
): Judged => ({ state, datum, why, trap });

/** What a judge is given. */
export interface Case {
	figure: Figure;
	s: Surroundings;
	facts: BenchFacts;
	workload: Link;
	profile: Link;
	/** Slugs of what it is held against; null for the baseline of each campaign. */
	over: (string | null)[];
	settings: ReturnType<typeof settingsIn>;
	/** Workloads and profiles of the sentence, however they are meant. */
	near: { workloads: string[]; profiles: string[] };
}

/**
 * The profile of a gain: the baseline cannot gain over itself, so where it is the one named, another of the sentence
 * is meant.
 */
export function gaining(of: Case): Case {
	const bases = of.over.flatMap((slug) => slug ?? of.facts.data.campaigns.map((one) => one.baseline));
	if (of.profile.slugs.length === 0 || !of.profile.slugs.every((slug) => bases.includes(slug))) return of;
	const slugs = of.near.profiles.filter((slug) => !bases.includes(slug));
	return { ...of, profile: slugs.length > 0 ? { slugs, hold: 'sentence' } : { slugs: [], hold: 'none' } };
}

/** A claim with all that its surroundings name. */
export function caseOf(figure: Figure, s: Surroundings, facts: BenchFacts): Case {
	const over = overOf(s);
	return {
		figure,
		s,
		facts,
		workload: linkOf('workload', s),
		profile: linkOf('profile', s),
		over: over.length > 0 ? over : [null],
		settings: settingsIn(s),
		near: { workloads: namedIn(s, 'workload'), profiles: namedIn(s, 'profile') }
	};
}

const has = (slugs: string[], slug: string | null): boolean => slug !== null && slugs.includes(slug);

const sure = ({ hold }: Link): boolean => hold === 'clause' || hold === 'sentence';

/** Digits that count, without leading noughts. @example significant('0.0742') === 3 */
const significant = (text: string): number => text.replace(/^[-0.]+/, '').replace(/\D/g, '').length;

/**
 * Data by how surely they are meant, the surest first: what the names next to the claim say; then looser, where one of
 * those names stands further off. Where nothing is named at all a number with three digits or more may still be
 * recognised, one with fewer is anybody's.
 */
export function tiers<T extends Datum>(data: readonly T[], { workload, profile, near, figure }: Case): T[][] {
	if (workload.hold === 'none' && profile.hold === 'none') {
		const told = figure.readings.some(({ text }) => significant(text) >= 3) && figure.hedge === null;
		return [told ? [...data] : []];
	}
	const ofWorkload = (one: T) => has(workload.slugs, one.workload);
	const ofProfile = (one: T) => has(profile.slugs, one.profile);
	const found = [
		data.filter(
			(one) => (workload.hold === 'none' || ofWorkload(one)) && (profile.hold === 'none' || ofProfile(one))
		)
	];
	const among = (slugs: string[], slug: string | null) => slugs.length === 0 || has(slugs, slug);
	if (workload.hold === 'sentence' || profile.hold === 'sentence')
		found.push(
			data.filter(
				(one) =>
					(workload.hold === 'clause' ? ofWorkload(one) : among(near.workloads, one.workload)) &&
					(profile.hold === 'clause' ? ofProfile(one) : among(near.profiles, one.profile))
			)
		);
	if (sure(workload) && !sure(profile)) found.push(data.filter(ofWorkload));
	if (sure(profile) && !sure(workload)) found.push(data.filter(ofProfile));
	return found;
}

/** Whether names say clearly enough which datum is meant that a different number contradicts it. */
export const clearlyMeant = ({ workload, profile }: Case, candidates: readonly Datum[]): boolean => {
	if (candidates.length === 0 || workload.hold === 'none' || workload.hold === 'heading') return false;
	const distinct = new Set(candidates.map((one) => `${one.workload}/${one.profile}`)).size;
	if (workload.hold === 'context') return profile.hold === 'clause' || profile.hold === 'sentence';
	return profile.hold === 'none' ? distinct === 1 : true;
};

/** Of several data the one nearest to what was printed. */
export const nearestTo = <T extends Datum>(
	data: readonly T[],
	value: number,
	of = (one: T) => one.value
): T | null =>
	[...data].sort((a, b) => Math.abs(Math.abs(of(a)) - value) - Math.abs(Math.abs(of(b)) - value))[0] ?? null;

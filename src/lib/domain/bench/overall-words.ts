import { costOf, costWords } from './cost-of';
import type { Overall, WorkloadFacts } from './figures';

type Named = Pick<WorkloadFacts, 'slug' | 'name' | 'unit'>;

const listed = (names: readonly string[]): string => new Intl.ListFormat('en-GB').format(names);

const reason = 'They measure what a profile costs, which is no part of how fast it is.';

/** The workloads that measure a cost, each with its kind. @example 'Idle draw (power) and Loudness (noise)' */
const costsIn = (workloads: readonly Named[]): string =>
	listed(
		workloads.flatMap(({ name, unit }) => {
			const cost = costOf(unit);
			return cost === null ? [] : [`${name} (${costWords[cost]})`];
		})
	);

/** Profiles that lack the same workloads, under the workloads they lack. */
function lacking(figures: readonly { name: string; figure: Overall }[]): Map<string, string[]> {
	const groups = new Map<string, string[]>();
	for (const { name, figure } of figures) {
		if (figure.missing.length === 0) continue;
		const key = figure.missing.join('\n');
		groups.set(key, [...(groups.get(key) ?? []), name]);
	}
	return groups;
}

/**
 * What the overall figures of a table rest on, sentence by sentence: the workloads in them, those left out and why, and
 * the profiles that lack some. Where there is no figure because nothing measures performance, that.
 * @param figures of the profiles printed, with the profiles' names
 * @param workloads of the campaign
 */
export function overallWords(
	figures: readonly { name: string; figure: Overall }[],
	workloads: readonly Named[]
): string[] {
	const costs = workloads.filter(({ unit }) => costOf(unit) !== null);
	if (figures.length === 0) {
		return costs.length > 0 && costs.length === workloads.length
			? [`There is no overall figure: no workload here measures performance, only ${costsIn(costs)}.`]
			: [];
	}
	const namesOf = (slugs: ReadonlySet<string>) => [
		...workloads.filter(({ slug }) => slugs.has(slug)).map(({ name }) => name),
		...[...slugs].filter((slug) => workloads.every((one) => one.slug !== slug))
	];
	const counted = new Set(figures.flatMap(({ figure }) => figure.workloads));
	const aside = new Set(
		figures.flatMap(({ figure }) => (figure.aside ?? []).map(({ workload }) => workload))
	);
	const ofOld = figures.some(({ figure }) => figure.aside === undefined);
	const left = workloads.filter(({ slug }) => aside.has(slug));
	return [
		`The overall figure rests on ${ofOld ? '' : 'performance alone: '}${listed(namesOf(counted))}.`,
		...(left.length > 0 ? [`Left out: ${costsIn(left)}. ${reason}`] : []),
		...[...lacking(figures)].map(
			([key, names]) =>
				`${listed(names)} ${names.length === 1 ? 'is' : 'are'} without ${listed(namesOf(new Set(key.split('\n'))))}, for want of readings on a side or of a ratio.`
		)
	];
}

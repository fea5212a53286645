import { type LadderSpec, ladderSpec } from '../plates/ladder-spec';
import { type SweepSpec, sweepSpec } from '../plates/sweep-spec';
import type { ArticleData } from '../data';
import { unknownName } from '../names-near';
import { found, missing, type Call, type Lookup } from './shape';

interface OfRig {
	slug: string;
	name: string;
	rig: { slug: string };
}

/** The one of a kind that a directive names, or the only one there is. */
function find<T extends OfRig>(what: 'ladder' | 'sweep', call: Call, among: readonly T[]): Lookup<T> {
	const name = call.attributes[what];
	const [first, second] = among;
	if (!first)
		return missing(`No rig of this article's campaigns has a ${what} yet. Begin one on the bench first.`);
	if (name === undefined && second === undefined) return found(first);
	const known = among.map((one) => one.slug);
	if (name === undefined)
		return missing(`${known.length} ${what}s are there. Add ${what}= to say which.`, known);
	const one = among.find(({ slug }) => slug === name);
	return one
		? found(one)
		: unknownName(`No rig of this article's campaigns has a ${what} called “${name}”.`, name, known);
}

/** The first campaign of the article on the same rig: its kit stands behind the plate. */
const campaignOf = (data: ArticleData, { rig }: OfRig): string =>
	data.campaigns.find((one) => one.rig.slug === rig.slug)?.slug ?? '';

/** `kind=ladder ladder=`: the attempts of a ladder. */
export function ladderPlate(call: Call, data: ArticleData): Lookup<LadderSpec> {
	const ladder = find('ladder', call, data.ladders ?? []);
	if (!ladder.ok) return ladder;
	const campaign = campaignOf(data, ladder.value);
	const spec = ladderSpec(ladder.value, data.zone, { campaign, title: call.attributes.title });
	return spec
		? found(spec)
		: missing(`${ladder.value.name} has no attempts that stand, so there is nothing to draw.`);
}

/** `kind=sweep sweep=`: the points of a sweep and its crossing. */
export function sweepPlate(call: Call, data: ArticleData): Lookup<SweepSpec> {
	const sweep = find('sweep', call, data.sweeps ?? []);
	if (!sweep.ok) return sweep;
	const campaign = campaignOf(data, sweep.value);
	const spec = sweepSpec(sweep.value, data.zone, { campaign, title: call.attributes.title });
	return spec
		? found(spec)
		: missing(`${sweep.value.name} has no passes that stand, so there is nothing to draw.`);
}

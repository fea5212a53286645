import { gainsSpec } from '../plates/gains-spec';
import { plateFigure } from '../plates/figure';
import { scoresSpec } from '../plates/scores-spec';
import { plateKinds, type PlateSpec } from '../plates/spec';
import { unknownName } from '../names-near';
import type { ArticleData, CampaignData } from '../data';
import { attribute, findBaseline, findCampaign, findWorkload } from './lookup';
import { ladderPlate, sweepPlate } from './plate-of-bench';
import { directive, found, missing, type Call, type Lookup, type UsedCell } from './shape';

/** `profiles=a,b` in the campaign's names; undefined for all of them. */
function chosen(call: Call, campaign: CampaignData): Lookup<string[] | undefined> {
	const names = call.attributes.profiles?.split(/[\s,]+/).filter((name) => name !== '');
	if (!names) return found(undefined);
	const known = campaign.profiles.map((one) => one.slug);
	const stranger = [...names, ...(call.attributes.subject ? [call.attributes.subject] : [])].find(
		(name) => !known.includes(name)
	);
	return stranger === undefined
		? found(names)
		: unknownName(`${campaign.name} has no profile called “${stranger}”.`, stranger, known);
}

function scores(call: Call, data: ArticleData): Lookup<PlateSpec> {
	if (call.attributes.workload === undefined) {
		return unknownName(
			'A plate of scores needs a workload.',

			'',
			data.campaigns.flatMap((campaign) => campaign.workloads.map((one) => one.slug))
		);
	}
	const place = findWorkload(call, data);
	if (!place.ok) return place;
	const { campaign, workload } = place.value;
	const profiles = chosen(call, campaign);
	if (!profiles.ok) return profiles;
	const { subject, title } = call.attributes;
	const spec = scoresSpec(campaign, workload, data, { profiles: profiles.value, subject, title });
	return spec
		? found(spec)
		: missing(`${workload.name} has no readings yet in ${campaign.name}, so there is nothing to draw.`);
}

function gains(call: Call, data: ArticleData): Lookup<PlateSpec> {
	const campaign = findCampaign(call, data);
	if (!campaign.ok) return campaign;
	const over = findBaseline(call, campaign.value);
	if (!over.ok) return over;
	const profiles = chosen(call, campaign.value);
	if (!profiles.ok) return profiles;
	const { subject, title } = call.attributes;
	const spec = gainsSpec(campaign.value, over.value, data, { profiles: profiles.value, subject, title });
	return spec
		? found(spec)
		: missing(
				`Nothing in ${campaign.value.name} was measured both with ${over.value.name} and with another profile.`
			);
}

/** The cells whose readings a plate shows. */
function cellsOf(spec: PlateSpec): UsedCell[] {
	const { campaign } = spec;
	if (spec.kind === 'ladder' || spec.kind === 'sweep') return [];
	if (spec.kind === 'scores') {
		return spec.rows.map(({ profile }) => ({ campaign, profile, workload: spec.workload }));
	}
	return spec.rows.flatMap(({ workload, points }) => [
		{ campaign, profile: spec.baseline.profile, workload },
		...points.flatMap((point) => (point ? [{ campaign, profile: point.profile, workload }] : []))
	]);
}

const byKind: Record<PlateSpec['kind'], (call: Call, data: ArticleData) => Lookup<PlateSpec>> = {
	scores,
	gains,
	ladder: ladderPlate,
	sweep: sweepPlate
};

const isKind = (kind: string): kind is PlateSpec['kind'] => kind in byKind;

/**
 * `::plate{kind=scores workload=}`, `::plate{kind=gains over=}`, `::plate{kind=ladder ladder=}` and
 * `::plate{kind=sweep sweep=}`: a chart of what is stored.
 */
export const plate = directive<PlateSpec>({
	name: 'plate',
	level: 'block',
	words: 'A chart: the scores of one workload, the gains over a profile, a ladder, or a sweep.',
	attributes: [
		attribute.oneOf(
			'kind',
			'scores of one workload, gains over a profile, a ladder, or a sweep',
			plateKinds,
			true
		),
		attribute.workload(false),
		attribute.over(),
		attribute.campaign(),
		{
			name: 'profiles',
			required: false,
			words: 'only these, with commas between; all if left out',
			values: () => null
		},
		{ ...attribute.profile(false), name: 'subject', words: 'the profile drawn in blue' },
		{
			name: 'ladder',
			required: false,
			words: 'the ladder, for a plate of one',
			values: (data) => (data.ladders ?? []).map((one) => one.slug)
		},
		{
			name: 'sweep',
			required: false,
			words: 'the sweep, for a plate of one',
			values: (data) => (data.sweeps ?? []).map((one) => one.slug)
		},
		{ name: 'title', required: false, words: 'a title of your own, in quotes', values: () => null }
	],
	resolve: (call, data) => {
		const { kind = 'scores' } = call.attributes;
		return isKind(kind) ? byKind[kind](call, data) : missing(`There is no plate of the kind “${kind}”.`);
	},
	render: (spec, { draw, call, platesAt }) => ({
		html: plateFigure(spec, draw(spec), call.line, platesAt),
		plain: spec.title,
		plate: spec,
		cells: cellsOf(spec),
		...(spec.campaign === '' ? {} : { campaigns: [spec.campaign] })
	})
});

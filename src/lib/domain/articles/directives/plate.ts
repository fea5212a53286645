import { gainsSpec } from '../plates/gains-spec';
import { plateFigure } from '../plates/figure';
import { scoresSpec } from '../plates/scores-spec';
import { plateKinds, type PlateSpec } from '../plates/spec';
import { unknownName } from '../names-near';
import type { ArticleData, CampaignData } from '../data';
import { attribute, findBaseline, findCampaign, findWorkload } from './lookup';
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
	if (spec.kind === 'scores') {
		return spec.rows.map(({ profile }) => ({ campaign, profile, workload: spec.workload }));
	}
	return spec.rows.flatMap(({ workload, points }) => [
		{ campaign, profile: spec.baseline.profile, workload },
		...points.flatMap((point) => (point ? [{ campaign, profile: point.profile, workload }] : []))
	]);
}

/** `::plate{kind=scores workload=}` and `::plate{kind=gains over=}`: a chart of stored runs. */
export const plate = directive<PlateSpec>({
	name: 'plate',
	level: 'block',
	words: 'A chart: the scores of one workload, or the gains over a profile.',
	attributes: [
		attribute.oneOf('kind', 'scores of one workload, or gains over a profile', plateKinds, true),
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
		{ name: 'title', required: false, words: 'a title of your own, in quotes', values: () => null }
	],
	resolve: (call, data) => (call.attributes.kind === 'gains' ? gains(call, data) : scores(call, data)),
	render: (spec, { draw, call, platesAt }) => ({
		html: plateFigure(spec, draw(spec), call.line, platesAt),
		plain: spec.title,
		plate: spec,
		cells: cellsOf(spec)
	})
});

import { valueKinds } from '../../bench/value-figures';
import { gainsSpec } from '../plates/gains-spec';
import { plateFigure } from '../plates/figure';
import { scoresSpec } from '../plates/scores-spec';
import { plateKinds, type PlateSpec } from '../plates/spec';
import { unknownName } from '../names-near';
import type { ArticleData } from '../data';
import { attribute, findBaseline, findCampaign, findWorkload } from './lookup';
import { ladderPlate, sweepPlate } from './plate-of-bench';
import { chosen, driftPlate, overallPlate, tradeOffPlate, valuePlate } from './plate-of-comparison';
import { directive, found, missing, type Call, type Lookup, type UsedCell } from './shape';

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
	switch (spec.kind) {
		// What they show is of a rig over many campaigns, or of no cell at all.
		case 'ladder':
		case 'sweep':
		case 'drift':
			return [];
		case 'scores':
			return spec.rows.map(({ profile }) => ({ campaign, profile, workload: spec.workload }));
		case 'value':
			return spec.rows.flatMap(({ profile }) =>
				spec.from.map((workload) => ({ campaign, profile, workload }))
			);
		case 'gains':
			return spec.rows.flatMap(({ workload, points }) => [
				{ campaign, profile: spec.baseline.profile, workload },
				...points.flatMap((point) => (point ? [{ campaign, profile: point.profile, workload }] : []))
			]);
		default:
			return [spec.baseline, ...spec.series].flatMap(({ profile }) =>
				spec.workloads.map((workload) => ({ campaign, profile, workload }))
			);
	}
}

const byKind: Record<PlateSpec['kind'], (call: Call, data: ArticleData) => Lookup<PlateSpec>> = {
	scores,
	gains,
	overall: overallPlate,
	value: valuePlate,
	'trade-off': tradeOffPlate,
	drift: driftPlate,
	ladder: ladderPlate,
	sweep: sweepPlate
};

const isKind = (kind: string): kind is PlateSpec['kind'] => kind in byKind;

/**
 * `::plate{kind=scores workload=}`, `::plate{kind=gains over=}`, `::plate{kind=overall over=}`,
 * `::plate{kind=value per= workload=}`, `::plate{kind=trade-off}`, `::plate{kind=drift rig= workload=}`,
 * `::plate{kind=ladder ladder=}` and `::plate{kind=sweep sweep=}`: a chart of what is stored.
 */
export const plate = directive<PlateSpec>({
	name: 'plate',
	level: 'block',
	words: 'A chart: scores, gains, overall gains, value, a trade-off, drift, a ladder, or a sweep.',
	attributes: [
		attribute.oneOf(
			'kind',
			'scores of one workload, gains over a profile, overall gains, value for power or price, what is gained and given up, stock over time, a ladder, or a sweep',
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
		attribute.oneOf(
			'per',
			'for a plate of value: watt if left out, price, or the energy of a run',
			valueKinds
		),
		{
			name: 'part',
			required: false,
			words: 'whose price, for value per price; the processor if left out',
			values: (data) =>
				data.campaigns.flatMap(({ kit }) => kit.filter((one) => one.price).map((one) => one.part))
		},
		{
			name: 'rig',
			required: false,
			words: 'whose stock, for a plate of drift',
			values: (data) => [...new Set((data.drifts ?? []).map((one) => one.rig.slug))]
		},
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
	lasting: true,
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

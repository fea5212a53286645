import { priceOf } from '../../bench/price-of';
import { perPower, perPrice, valueKinds, type ValueFigures } from '../../bench/value-figures';
import type { ArticleData, CampaignData } from '../data';
import { unknownName } from '../names-near';
import { driftSpec } from '../plates/drift-spec';
import { overallSpec } from '../plates/overall-spec';
import type { PlateSpec } from '../plates/spec';
import { tradeOffSpec } from '../plates/trade-off-spec';
import { valueSpec } from '../plates/value-spec';
import { findBaseline, findCampaign } from './lookup';
import { found, missing, type Call, type Lookup } from './shape';

/** `profiles=a,b` in the campaign's names; undefined for all of them. */
export function chosen(call: Call, campaign: CampaignData): Lookup<string[] | undefined> {
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

/** `kind=overall over=`: the geometric mean of each profile. */
export function overallPlate(call: Call, data: ArticleData): Lookup<PlateSpec> {
	const campaign = findCampaign(call, data);
	if (!campaign.ok) return campaign;
	const over = findBaseline(call, campaign.value);
	if (!over.ok) return over;
	const profiles = chosen(call, campaign.value);
	if (!profiles.ok) return profiles;
	const { subject, title } = call.attributes;
	const spec = overallSpec(campaign.value, over.value, data, { profiles: profiles.value, subject, title });
	return spec
		? found(spec)
		: missing(
				`Nothing in ${campaign.value.name} was measured both with ${over.value.name} and with another.`
			);
}

/** `kind=trade-off`: classes of work and costs against the campaign's baseline. */
export function tradeOffPlate(call: Call, data: ArticleData): Lookup<PlateSpec> {
	const campaign = findCampaign(call, data);
	if (!campaign.ok) return campaign;
	const profiles = chosen(call, campaign.value);
	if (!profiles.ok) return profiles;
	const { subject, title } = call.attributes;
	const spec = tradeOffSpec(campaign.value, data, { profiles: profiles.value, subject, title });
	return spec
		? found(spec)
		: missing(
				`Nothing in ${campaign.value.name} was measured both with its baseline and with another profile.`
			);
}

function valuesOf(call: Call, campaign: CampaignData): Lookup<ValueFigures[]> {
	const { per = 'watt', part } = call.attributes;
	if (per !== 'price') return found(perPower(campaign).filter((one) => one.kind === per));
	const price = priceOf(campaign.kit, part);
	if (price) return found(perPrice(campaign, price, price.partName));
	return part === undefined
		? missing(`No part of ${campaign.rig.name} has a price. Record one in the stores first.`)
		: unknownName(
				`${campaign.rig.name} has no part called “${part}” with a price.`,
				part,
				campaign.kit.filter((line) => line.price).map((line) => line.part)
			);
}

/** `kind=value per=watt|price|energy workload=`: a figure made of two. */
export function valuePlate(call: Call, data: ArticleData): Lookup<PlateSpec> {
	const { per = 'watt', workload, subject, title } = call.attributes;
	if (!(valueKinds as readonly string[]).includes(per))
		return unknownName(`A plate of value is per watt, price or energy, not “${per}”.`, per, [...valueKinds]);
	const campaign = findCampaign(call, data);
	if (!campaign.ok) return campaign;
	const profiles = chosen(call, campaign.value);
	if (!profiles.ok) return profiles;
	const figures = valuesOf(call, campaign.value);
	if (!figures.ok) return figures;
	const known = figures.value.map((one) => one.workload);
	if (known.length === 0)
		return missing(
			per === 'price'
				? `${campaign.value.name} has no measured workload whose score is better higher.`
				: `${campaign.value.name} has no workload with one measure of power in its class of work.`
		);
	const one =
		workload === undefined ? figures.value[0] : figures.value.find((row) => row.workload === workload);
	if (!one || (workload === undefined && known.length > 1))
		return workload === undefined
			? missing('Several workloads have this figure. Add workload= to say which.', known)
			: unknownName(`“${workload}” has no such figure in ${campaign.value.name}.`, workload, known);
	const spec = valueSpec(campaign.value, one, data, { profiles: profiles.value, subject, title });
	return spec ? found(spec) : missing(`No profile named has a figure of ${one.name}.`);
}

/** `kind=drift rig= workload=`: stock over time. */
export function driftPlate(call: Call, data: ArticleData): Lookup<PlateSpec> {
	const { rig, workload, title } = call.attributes;
	const drifts = data.drifts ?? [];
	const ofRig = drifts.filter((one) => rig === undefined || one.rig.slug === rig);
	if (drifts.length === 0) return missing("Stock of this article's rigs was not measured yet.");
	if (ofRig.length === 0)
		return unknownName(`No rig of this article is called “${rig}”.`, rig ?? '', [
			...new Set(drifts.map((one) => one.rig.slug))
		]);
	const known = [...new Set(ofRig.map((one) => one.workload.slug))];
	const wanted = ofRig.filter((one) => workload === undefined || one.workload.slug === workload);
	const [first, second] = wanted;
	if (!first)
		return unknownName(`Stock was not measured with “${workload}” on this rig.`, workload ?? '', known);
	if (second) return missing('There are several. Add rig= and workload= to say which.', known);
	const campaign = data.campaigns.find((one) => one.rig.slug === first.rig.slug)?.slug ?? '';
	const spec = driftSpec(first, data.zone, { campaign, title });
	return spec
		? found(spec)
		: missing(
				`There are too few runs of stock with ${first.workload.name} on ${first.rig.name} for a chart.`
			);
}

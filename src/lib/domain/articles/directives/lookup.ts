import type { CellFigures, Summary, WorkloadFacts } from '../../bench/figures';
import type { ArticleData, CampaignData, ProfileFacts } from '../data';
import { unknownName } from '../names-near';
import { found, missing, type Attribute, type Call, type Lookup, type Values } from './shape';

/** A profile in the campaign that has it. */
export interface ProfilePlace {
	campaign: CampaignData;
	profile: ProfileFacts;
}

/** A measured cell with all that its names stand for. */
export interface Cell extends ProfilePlace {
	workload: WorkloadFacts;
	figures: CellFigures;
	summary: Summary;
}

const slugs = (items: readonly { slug: string }[]): string[] => items.map((item) => item.slug);

/** The campaigns a directive may mean: the one it names, else all that the article is bound to. */
export function campaignsOf(call: Call, data: ArticleData): Lookup<CampaignData[]> {
	if (data.campaigns.length === 0) {
		return missing('This article is bound to no campaign yet. Bind one, and its data can be named here.');
	}
	const name = call.attributes.campaign;
	if (name === undefined) return found(data.campaigns);
	const campaign = data.campaigns.find((one) => one.slug === name);
	return campaign
		? found([campaign])
		: unknownName(`This article is bound to no campaign called “${name}”.`, name, slugs(data.campaigns));
}

/** Picks the one campaign of those that have everything named, or says that there are several. */
function only<T>(call: Call, places: T[], campaigns: string[], otherwise: () => Lookup<T>): Lookup<T> {
	const [first, second] = places;
	if (first === undefined) return otherwise();
	if (second === undefined) return found(first);
	return missing(
		`${campaigns.length} campaigns of this article have this. Add campaign= to say which.`,
		campaigns
	);
}

/** The campaign meant, where a directive needs nothing else: the one named, or the only one. */
export function findCampaign(call: Call, data: ArticleData): Lookup<CampaignData> {
	const campaigns = campaignsOf(call, data);
	if (!campaigns.ok) return campaigns;
	return only(call, campaigns.value, slugs(campaigns.value), () => missing('There is no campaign.'));
}

/** A profile by name, in the campaign that has it. */
export function findProfile(call: Call, data: ArticleData): Lookup<ProfilePlace> {
	const campaigns = campaignsOf(call, data);
	if (!campaigns.ok) return campaigns;
	const name = call.attributes.profile ?? '';
	const places = campaigns.value.flatMap((campaign) => {
		const profile = campaign.profiles.find((one) => one.slug === name);
		return profile ? [{ campaign, profile }] : [];
	});
	return only(call, places, slugs(places.map((place) => place.campaign)), () =>
		unknownName(
			`No profile of this article's campaigns is called “${name}”.`,

			name,
			campaigns.value.flatMap((campaign) => slugs(campaign.profiles))
		)
	);
}

/** A workload by name, in the campaign that has it. */
export function findWorkload(
	call: Call,
	data: ArticleData
): Lookup<{ campaign: CampaignData; workload: WorkloadFacts }> {
	const campaigns = campaignsOf(call, data);
	if (!campaigns.ok) return campaigns;
	const name = call.attributes.workload ?? '';
	const places = campaigns.value.flatMap((campaign) => {
		const workload = campaign.workloads.find((one) => one.slug === name);
		return workload ? [{ campaign, workload }] : [];
	});
	return only(call, places, slugs(places.map((place) => place.campaign)), () =>
		unknownName(
			`No workload of this article's campaigns is called “${name}”.`,

			name,
			campaigns.value.flatMap((campaign) => slugs(campaign.workloads))
		)
	);
}

/** The figures of one cell of a campaign; undefined where the plan has no such cell. */
export const figuresOf = (
	campaign: CampaignData,
	profile: string,
	workload: string
): CellFigures | undefined =>
	campaign.cells.find((cell) => cell.profile === profile && cell.workload === workload);

/** A measured cell by the names of its workload and profile. */
export function findCell(call: Call, data: ArticleData): Lookup<Cell> {
	const ofWorkload = findWorkload(call, data);
	const ofProfile = findProfile(call, data);
	const campaigns = campaignsOf(call, data);
	if (!campaigns.ok) return campaigns;
	const places = campaigns.value.flatMap((campaign) => {
		const profile = campaign.profiles.find((one) => one.slug === call.attributes.profile);
		const workload = campaign.workloads.find((one) => one.slug === call.attributes.workload);
		const figures = profile && workload && figuresOf(campaign, profile.slug, workload.slug);
		return figures ? [{ campaign, profile, workload, figures }] : [];
	});
	const place = only(call, places, slugs(places.map((one) => one.campaign)), () => {
		// Several campaigns may have one of the names: only a name that none has is the mistake.
		if (!ofWorkload.ok && ofWorkload.problem.message.startsWith('No workload')) return ofWorkload;
		if (!ofProfile.ok && ofProfile.problem.message.startsWith('No profile')) return ofProfile;
		return missing('No campaign of this article runs this workload with this profile.');
	});
	if (!place.ok) return place;
	const { summary } = place.value.figures;
	if (!summary) {
		return missing(
			`${place.value.workload.name} with ${place.value.profile.name} has no readings yet, so there is no figure to print.`
		);
	}
	return found({ ...place.value, summary });
}

/** The profile that a gain is held against: `over`, or the campaign's baseline. */
export function findBaseline(call: Call, campaign: CampaignData): Lookup<ProfileFacts> {
	const name = call.attributes.over ?? campaign.baseline;
	const profile = campaign.profiles.find((one) => one.slug === name);
	return profile
		? found(profile)
		: unknownName(
				`${campaign.name} has no profile called “${name}” to hold this against.`,
				name,
				slugs(campaign.profiles)
			);
}

const all = (data: ArticleData, attributes: Record<string, string>): CampaignData[] => {
	const chosen = data.campaigns.filter((campaign) => campaign.slug === attributes.campaign);
	return chosen.length > 0 ? chosen : data.campaigns;
};
const unique = (names: string[]): Values => [...new Set(names)];

/** The attributes that several directives share. */
export const attribute = {
	campaign: (): Attribute => ({
		name: 'campaign',
		required: false,
		words: 'the campaign, where several have these names',
		values: (data) => slugs(data.campaigns)
	}),
	workload: (required = true): Attribute => ({
		name: 'workload',
		required,
		words: 'what was run',
		values: (data, given) => unique(all(data, given).flatMap((campaign) => slugs(campaign.workloads)))
	}),
	profile: (required = true): Attribute => ({
		name: 'profile',
		required,
		words: 'the settings it ran with',
		values: (data, given) => unique(all(data, given).flatMap((campaign) => slugs(campaign.profiles)))
	}),
	over: (): Attribute => ({
		name: 'over',
		required: false,
		words: 'the profile it is held against; the baseline if left out',
		values: (data, given) => unique(all(data, given).flatMap((campaign) => slugs(campaign.profiles)))
	}),
	oneOf: (name: string, words: string, values: readonly string[], required = false): Attribute => ({
		name,
		required,
		words,
		values: () => values
	}),
	text: (name: string, words: string, required = false): Attribute => ({
		name,
		required,
		words,
		values: () => null
	})
};

import { asStock } from '../bench/tuning/setting-number';
import type { ArticleData, CampaignData } from './data';

/** What a name between double braces stands for at one place. */
interface Scope {
	words: Record<string, string>;
	/** The lists a section can run over from here. */
	lists: Record<string, () => Scope[]>;
}

/** A name as it may stand in running Markdown: marks that would set it otherwise are escaped. */
const plainName = (name: string): string => name.replace(/[\\`*_[\]{}<>#|:]/g, '\\$&');

function scopeOf(campaign: CampaignData, alone: boolean): Scope {
	const ofProfiles = (tuned: boolean) => () =>
		campaign.profiles
			.filter((one) => one.slug !== campaign.baseline)
			.filter((one) => !tuned || one.settings.some((fact) => !asStock(fact)))
			.map((one) => scope({ profile: one.slug, 'profile.name': plainName(one.name) }));
	const lists: Scope['lists'] = {
		profiles: ofProfiles(false),
		tuned: ofProfiles(true),
		workloads: () =>
			campaign.workloads.map((one) => scope({ workload: one.slug, 'workload.name': plainName(one.name) }))
	};
	const baseline = campaign.profiles.find((one) => one.slug === campaign.baseline);
	const shared = {
		campaign: campaign.slug,
		'campaign.name': plainName(campaign.name),
		rig: campaign.rig.slug,
		baseline: campaign.baseline,
		'baseline.name': plainName(baseline?.name ?? ''),
		// Names are told apart by their campaign only where there are several.
		of: alone ? '' : ` campaign=${campaign.slug}`
	};
	const scope = (words: Record<string, string>): Scope => ({ words: { ...shared, ...words }, lists });
	return scope({});
}

const section = /\{\{#([a-z]+)\}\}(\n?)([\s\S]*?)\{\{\/\1(.*?)\}\}(\n?)/;

/** Runs the sections of a text, outermost first, then puts the names in. Words of an outer scope hold inside. */
function fill(text: string, scope: Scope): string {
	let out = '';
	let rest = text;
	for (let match = section.exec(rest); match; match = section.exec(rest)) {
		const [whole, name = '', opened = '', body = '', between = '', closed = ''] = match;
		const items = scope.lists[name]?.() ?? [];
		const parts = items.map((item) =>
			fill(body, { words: { ...scope.words, ...item.words }, lists: item.lists })
		);
		out += names(rest.slice(0, match.index), scope) + parts.join(between);
		// A section on lines of its own leaves no empty lines behind; one within a line keeps its line's end.
		if (opened === '') out += closed;
		rest = rest.slice(match.index + whole.length);
	}
	return out + names(rest, scope);
}

const names = (text: string, { words }: Scope): string =>
	text.replace(/\{\{([a-z.]+)\}\}/g, (whole, name: string) => words[name] ?? whole);

/**
 * A template's text with the names of an article's campaigns in it, so that its directives work from the start.
 * `{{campaign}} {{rig}} {{baseline}} {{profile}} {{workload}}` are slugs, the same with `.name` are names to read,
 * `{{of}}` says which campaign where there are several; `{{#campaigns}} … {{/campaigns}}` and, inside it,
 * `{{#profiles}}`, `{{#tuned}}` (those that change settings) and `{{#workloads}}` repeat what they hold;
 * what stands behind the closing name goes between the repeats.
 */
export function fillTemplate(template: string, data: ArticleData): string {
	const alone = data.campaigns.length === 1;
	const campaigns = () => data.campaigns.map((campaign) => scopeOf(campaign, alone));
	return fill(template, { words: {}, lists: { campaigns } })
		.replace(/\n{3,}/g, '\n\n')
		.trim()
		.concat('\n');
}

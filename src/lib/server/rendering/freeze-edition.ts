import { createHash } from 'node:crypto';
import type { ArticleData } from '../../domain/articles/data';
import { plateCsv } from '../../domain/articles/plates/numbers';
import { picturesIn, type PictureFacts } from '../../domain/articles/pictures/picture';
import { renderArticle, type Rendered } from '../../domain/articles/render-article';
import type { PlateSpec } from '../../domain/articles/plates/spec';
import type { Comparison, Summary } from '../../domain/bench/figures';
import { drawPlate } from './draw-plate';
import { sanitisePage } from './sanitise-page';
import { standaloneSvg } from './standalone-svg';

export interface EditionInput {
	/** The article's slug: its plates' files stand under it. */
	slug: string;
	title: string;
	standfirst: string;
	source: string;
	data: ArticleData;
}

export interface FrozenPlate {
	key: string;
	kind: string;
	title: string;
	/** A file of its own, with colours and type in it. */
	svg: string;
	csv: string;
}

/** The figures of one printed cell, at full precision. */
export interface FrozenFigures {
	summary: Summary;
	comparison: Comparison | null;
	/** The profile the comparison is against. */
	over: string;
}

export interface FrozenResult {
	campaignSlug: string;
	rigName: string;
	rigRevision: number;
	profileSlug: string;
	profileName: string;
	workloadSlug: string;
	workloadName: string;
	unit: string;
	better: string;
	figures: FrozenFigures;
}

export interface FrozenEdition {
	/** The page body, sanitised: to be served as it is. */
	page: string;
	plain: string;
	plates: FrozenPlate[];
	/** Hashes of the stored pictures the page shows, in its order. */
	pictures: string[];
	/** Cells whose readings the page shows. */
	results: FrozenResult[];
	/** Slugs of the parts on the rigs of the campaigns the page shows, for `edition_part`. */
	partSlugs: string[];
	/** Names of those who took the readings shown, in the order they first appear. */
	testerNames: string[];
	/** SHA-256 over title, standfirst, source, data, page, plates and pictures. */
	hash: string;
	/** The data it was made from; of the glossary, the terms it uses. */
	data: ArticleData;
	/** What was found out about the page, errors included: preflight decides what they mean. */
	facts: Rendered;
}

/** JSON with the keys of every object in order, so that the same content has the same text. */
export function canonicalJson(value: unknown): string {
	return JSON.stringify(value, (_, inner: unknown) =>
		inner !== null && typeof inner === 'object' && !Array.isArray(inner)
			? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0)))
			: inner
	);
}

/**
 * The hash of an edition: SHA-256 in hex, other as soon as any of it is. Its pictures are in it by the hashes of their
 * files, which are also their addresses.
 */
export function editionHash(
	edition: Pick<EditionInput, 'title' | 'standfirst' | 'source' | 'data'> & {
		page: string;
		plates: FrozenPlate[];
		/** Left out where there are none, as in editions from before there were any. */
		pictures?: PictureFacts[];
	}
): string {
	const { title, standfirst, source, data, page, plates } = edition;
	const pictures = edition.pictures?.length ? edition.pictures : undefined;
	return createHash('sha256')
		.update(canonicalJson({ title, standfirst, source, data, page, plates, pictures }))
		.digest('hex');
}

function resultsOf({ uses }: Rendered, data: ArticleData): FrozenResult[] {
	return uses.cells.flatMap((used): FrozenResult[] => {
		const campaign = data.campaigns.find((one) => one.slug === used.campaign);
		const profile = campaign?.profiles.find((one) => one.slug === used.profile);
		const workload = campaign?.workloads.find((one) => one.slug === used.workload);
		const cell = campaign?.cells.find(
			(one) => one.profile === used.profile && one.workload === used.workload
		);
		if (!campaign || !profile || !workload || !cell?.summary) return [];
		return [
			{
				campaignSlug: campaign.slug,
				rigName: campaign.rig.name,
				rigRevision: campaign.rig.revision,
				profileSlug: profile.slug,
				profileName: profile.name,
				workloadSlug: workload.slug,
				workloadName: workload.name,
				unit: workload.unit,
				better: workload.better,
				figures: { summary: cell.summary, comparison: cell.comparison, over: campaign.baseline }
			}
		];
	});
}

function testersOf({ uses }: Rendered, data: ArticleData): string[] {
	const names = uses.cells.flatMap((used) => {
		const campaign = data.campaigns.find((one) => one.slug === used.campaign);
		return (
			campaign?.cells.find((one) => one.profile === used.profile && one.workload === used.workload)
				?.testers ?? []
		);
	});
	return [...new Set(names)];
}

/** What an edition keeps of its data: of the glossary, the terms that stand on the page. */
function keptData(data: ArticleData, { uses }: Rendered): ArticleData {
	const { glossary } = data;
	return glossary ? { ...data, glossary: glossary.filter(({ slug }) => uses.terms.includes(slug)) } : data;
}

/**
 * Freezes what is approved: page, plates and figures made once from source and data, sanitised last, with the
 * hash over all of it. Takes some 100 ms for a long article.
 */
export function freezeEdition(input: EditionInput): FrozenEdition {
	const { slug, title, standfirst, source } = input;
	const drawings = new Map<PlateSpec, string>();
	const draw = (spec: PlateSpec): string => {
		const drawing = drawPlate(spec);
		drawings.set(spec, drawing);
		return drawing;
	};
	const facts = renderArticle(source, input.data, draw, { platesAt: `/articles/${slug}/plates/` });
	const data = keptData(input.data, facts);
	const page = sanitisePage(facts.html);
	const plates = facts.plates.map(({ key, spec }): FrozenPlate => ({
		key,
		kind: spec.kind,
		title: spec.title.slice(0, 200),
		svg: standaloneSvg(sanitisePage(drawings.get(spec) ?? drawPlate(spec))),
		csv: plateCsv(spec)
	}));
	const named = picturesIn(page);
	const pictures = (data.pictures ?? []).filter((one) => named.includes(one.sha256));
	const shown = data.campaigns.filter((campaign) => facts.uses.campaigns.includes(campaign.slug));
	return {
		page,
		plain: facts.plain,
		plates,
		pictures: pictures.map((one) => one.sha256),
		results: resultsOf(facts, data),
		partSlugs: [...new Set(shown.flatMap((campaign) => campaign.kit.map((line) => line.part)))],
		testerNames: testersOf(facts, data),
		hash: editionHash({ title, standfirst, source, data, page, plates, pictures }),
		data,
		facts
	};
}

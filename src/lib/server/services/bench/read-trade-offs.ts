import type { CampaignData } from '../../../domain/articles/data';
import type { PlateSpec } from '../../../domain/articles/plates/spec';
import { tradeOffSpec } from '../../../domain/articles/plates/trade-off-spec';
import { valueSpec } from '../../../domain/articles/plates/value-spec';
import { priceOf } from '../../../domain/bench/price-of';
import { type ProfileTradeOff, tradeOffs } from '../../../domain/bench/trade-off';
import { type TradeOffWords, tradeOffWords } from '../../../domain/bench/trade-off-words';
import { perPower, perPrice, type ValueFigures } from '../../../domain/bench/value-figures';
import { comparedTogether } from '../../../domain/bench/held-against';
import { done, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { kitOf } from '../../db/queries/campaign-facts';
import * as settings from '../../db/queries/settings';
import { campaignAsData } from './campaign-as-data';
import { readCampaign } from './read-campaign';

export interface TradeOffPage {
	campaign: string;
	name: string;
	baseline: { slug: string; name: string };
	profiles: { slug: string; name: string }[];
	together: number;
	sides: (ProfileTradeOff & { words: TradeOffWords })[];
	values: ValueFigures[];
	/** The price that value is reckoned with; null where no part has one. */
	price: ReturnType<typeof priceOf>;
	/** Parts with a price, for the choice. */
	priced: { part: string; partName: string }[];
	plates: PlateSpec[];
}

function platesOf(data: CampaignData, values: ValueFigures[], zone: string): PlateSpec[] {
	return [
		tradeOffSpec(data, { zone }),
		...values.map((figures) => valueSpec(data, figures, { zone }))
	].filter((spec) => spec !== null);
}

/** What every profile of a campaign gains and gives up against a baseline, on one page. */
export async function readTradeOffs(
	ctx: Context,
	campaignRef: string,
	asked: { baseline: string | null; part: string | null }
): Promise<Outcome<TradeOffPage>> {
	const read = await readCampaign(ctx, campaignRef, asked.baseline);
	if (!read.ok) return read;
	const { plan } = read.value;
	const [rows, { zone }] = await Promise.all([
		kitOf(ctx.db, [plan.head.rigRevisionId]),
		settings.publication(ctx.db)
	]);
	const kit = rows.map(({ maker, model, ...row }) => ({ ...row, partName: `${maker} ${model}` }));
	const data = campaignAsData(read.value, kit);
	const price = priceOf(kit, asked.part ?? undefined) ?? priceOf(kit);
	const values = [...perPower(data), ...(price ? perPrice(data, price, price.partName) : [])];
	return done({
		campaign: plan.head.slug,
		name: plan.head.name,
		baseline: {
			slug: data.baseline,
			name: plan.profiles.find((row) => row.slug === data.baseline)?.name ?? data.baseline
		},
		profiles: plan.profiles.map(({ slug, name }) => ({ slug, name })),
		together: comparedTogether(data.cells),
		sides: tradeOffs(data).map((side) => ({ ...side, words: tradeOffWords(side) })),
		values,
		price,
		priced: kit.filter((row) => row.price).map(({ part, partName }) => ({ part, partName })),
		plates: platesOf(data, values, zone)
	});
}

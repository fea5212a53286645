import { sweepReport } from '../../bench/stability/sweep-facts';
import { currencyDigits, formatMoney } from '../../shared/money';
import { printed, printedRange, withUnit } from '../../shared/quantity';
import type { ArticleData, CampaignData } from '../data';
import { front, type Datum } from './datum';

const plain = (campaign: CampaignData) => ({
	campaign: campaign.slug,
	workload: null,
	profile: null,
	over: null,
	interval: null,
	range: null
});

/** Prices of the kit, line by line and together. */
export function prices(data: ArticleData): Datum[] {
	return data.campaigns.flatMap((campaign) => {
		const lines = campaign.kit.flatMap(({ partName, price }) => (price ? [{ partName, ...price }] : []));
		const sums = new Map<string, number>();
		for (const { currency, amountMinor } of lines)
			sums.set(currency, (sums.get(currency) ?? 0) + amountMinor);
		const all = [
			...lines.map(({ partName, currency, amountMinor }) => ({ partName, currency, amountMinor })),
			...[...sums].map(([currency, amountMinor]) => ({ partName: 'The kit', currency, amountMinor }))
		];
		return all.map(({ partName, currency, amountMinor }): Datum => ({
			...plain(campaign),
			kind: 'price',
			value: Number(`${amountMinor}e-${currencyDigits(currency)}`),
			unit: currency,
			called: front(partName),
			name: front(partName),
			printed: formatMoney(amountMinor, currency)
		}));
	});
}

/** How warm the room was. */
export function ambients(data: ArticleData): Datum[] {
	return data.campaigns.flatMap((campaign) => {
		const values = campaign.cells.flatMap((cell) => (cell.ambientC === null ? [] : [cell.ambientC]));
		if (values.length === 0) return [];
		const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
		return [...new Set([mean, ...values])].map((value): Datum => ({
			...plain(campaign),
			kind: 'ambient',
			value,
			unit: '°C',
			called: 'ambient',
			name: 'Ambient of these runs',
			printed: withUnit(printed(value, { decimals: 1 }), '°C')
		}));
	});
}

/** Switch points of the sweeps, and what to set. */
export function switchPoints(data: ArticleData): Datum[] {
	return (data.sweeps ?? []).flatMap((sweep): Datum[] => {
		const point = sweepReport(sweep)?.point;
		if (!point || point.crossingA === null) return [];
		const { crossingA, ci95, setA } = point;
		const halfWidth = ci95 ? (ci95[1] - ci95[0]) / 2 : null;
		return [crossingA, ...(setA === null ? [] : [setA])].map((value) => ({
			kind: 'switch-point',
			value,
			unit: 'A',
			interval: ci95,
			campaign: '',
			workload: null,
			profile: sweep.profile.slug,
			over: null,
			called: 'switch point',
			name: `Switch point, ${front(sweep.profile.name)}`,
			printed: withUnit(printed(value, { halfWidth }), 'A'),
			range: ci95 && printedRange(ci95)
		}));
	});
}

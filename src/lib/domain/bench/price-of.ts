import { decimalAmount } from '../shared/money';
import type { DatedPrice } from './statistics/value';

interface PricedLine {
	part: string;
	partName: string;
	kind: string;
	price: { amountMinor: number; currency: string; observedOn: string } | null;
}

/** The price that value is reckoned with: of the part named, else of the processor, else of the first part with one. */
export function priceOf(
	kit: readonly PricedLine[],
	part?: string
): (DatedPrice & { part: string; partName: string }) | null {
	const priced = kit.flatMap(({ price, ...line }) =>
		price && price.amountMinor > 0 ? [{ ...line, price }] : []
	);
	const line =
		part === undefined
			? (priced.find((one) => one.kind === 'processor') ?? priced[0])
			: priced.find((one) => one.part === part);
	if (!line) return null;
	const { amountMinor, currency, observedOn } = line.price;
	return {
		part: line.part,
		partName: line.partName,
		amount: Number(decimalAmount(amountMinor, currency)),
		currency,
		date: observedOn
	};
}

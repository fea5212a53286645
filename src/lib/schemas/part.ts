import { z } from 'zod';
import { amountWanted, isAmount, isCurrency, minorUnits } from '../domain/shared/money';
import { partKinds } from '../domain/stores/words';
import { line, optionalSlug, unchosen, versionSeen } from './fields';
import { apiListing, listing } from './listing';

/** A line of the specification; a line left blank is dropped, one half filled is refused. */
const specificationLine = z
	.object({
		name: line(120).default(''),
		value: line(200).default(''),
		unit: line(40).default('')
	})
	.superRefine((row, ctx) => {
		const filled = row.name || row.value || row.unit;
		if (filled && !row.name)
			ctx.addIssue({ code: 'custom', path: ['name'], message: 'Name this line, or clear it.' });
		if (filled && !row.value)
			ctx.addIssue({ code: 'custom', path: ['value'], message: 'Give its value, or clear the line.' });
	});

const specification = z
	.array(specificationLine)
	.max(200, 'Keep the specification to 200 lines.')
	.default([])
	.transform((rows) =>
		rows
			.filter((row) => row.name !== '')
			.map(({ name, value, unit }) => (unit === '' ? { name, value } : { name, value, unit }))
	);

const amount = z.union([z.string(), z.number()], amountWanted).transform(String);

const priceFields = z.object({
	/** A decimal amount in the currency, such as "689.00". Checked by itself, so that a wrong currency hides no fault. */
	amount: amount.refine(isAmount, amountWanted).default(''),
	currency: z
		.string('Write the three letters of the currency.')
		.trim()
		.toUpperCase()
		.refine(isCurrency, 'This is not an ISO 4217 currency code, such as USD or EUR.'),
	observedOn: z.iso.date('Write the date as year-month-day.'),
	/** Where the price was seen. */
	source: line(200).default('')
});

type PriceFields = z.output<typeof priceFields>;

const toMinorUnits = ({ amount, ...rest }: PriceFields, ctx: z.RefinementCtx) => {
	const parsed = minorUnits(amount, rest.currency);
	if (parsed.ok) return { ...rest, amountMinor: parsed.amountMinor };
	ctx.addIssue({ code: 'custom', path: ['amount'], message: parsed.message });
	return z.NEVER;
};

/** A price seen on a date. Out: integer minor units. */
export const priceInput = priceFields.transform(toMinorUnits);
export type PriceInput = z.output<typeof priceInput>;
export type PriceTyped = z.input<typeof priceInput>;

const partFields = {
	kind: z.enum(partKinds, 'Choose what kind of part it is.'),
	maker: line(120).min(1, 'Say who makes it.'),
	model: line(160).min(1, 'A part needs its model name.'),
	specification
};

/** A price of a new part, whose row may be left without an amount. */
const priceRow = priceFields.extend({
	amount: amount.refine((text) => text.trim() === '' || isAmount(text), amountWanted).default('')
});

/** A new part, with the prices already seen. A price row without an amount is dropped. */
export const partInput = z.object({
	...partFields,
	slug: optionalSlug,
	prices: z
		.array(priceRow.transform((row, ctx) => (row.amount.trim() === '' ? null : toMinorUnits(row, ctx))))
		.max(50, 'Add at most 50 prices at once.')
		.default([])
		.transform((rows) => rows.filter((row) => row !== null))
});
export type PartInput = z.output<typeof partInput>;
export type PartTyped = z.input<typeof partInput>;

/** A change to a part; its slug stays, because articles and scripts call it by that. */
export const partEdit = z.object({ ...partFields, version: versionSeen });
export type PartEdit = z.output<typeof partEdit>;
export type PartEditTyped = z.input<typeof partEdit>;

export const blankSpecificationLine = () => ({ name: '', value: '', unit: '' });

/** An empty form. `today` is the date in the publication's zone. */
export const blankPart = (today: string, currency = 'USD'): PartTyped => ({
	slug: '',
	kind: unchosen(),
	maker: '',
	model: '',
	specification: [blankSpecificationLine(), blankSpecificationLine(), blankSpecificationLine()],
	prices: [blankPrice(today, currency)]
});

export const blankPrice = (today: string, currency = 'USD'): PriceTyped => ({
	amount: '',
	currency,
	observedOn: today,
	source: ''
});

/** What the list of parts takes from its address. */
export const partsQuery = listing(['name', 'kind', 'newest']).extend({ kind: z.enum(partKinds).optional() });
export type PartsQuery = z.output<typeof partsQuery>;

export const partsApiQuery = apiListing.extend({ kind: z.enum(partKinds).optional() });
export type PartsApiQuery = z.output<typeof partsApiQuery>;

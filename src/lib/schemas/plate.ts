import { z } from 'zod';
import { directions } from '../domain/bench/words';
import { verdicts } from '../domain/bench/figures';
import { valueKinds } from '../domain/bench/value-figures';
import { ladderResults } from '../domain/articles/plates/ladder-spec';

const words = z.string().max(1000);
const name = z.string().max(200);
const figure = z.number();
const interval = z.tuple([figure, figure]).nullable();
const base = {
	title: words,
	sub: words,
	/** An overall plate names every workload in it: 200 of 200 letters at the most. */
	foot: z.array(z.string().max(50_000)).max(80),
	campaign: name
};

const bar = {
	profile: name,
	name,
	series: z.number().int().min(0),
	value: figure,
	ci95: interval,
	n: z.number().int().min(0),
	printed: name,
	printedInterval: name.nullable()
};
const bars = { ...base, workload: name, unit: name, better: z.enum(directions) };

const scores = z.object({
	...bars,
	kind: z.literal('scores'),
	rows: z.array(z.object({ ...bar, mean: figure, median: figure, sd: figure.nullable() })).max(100)
});

const value = z.object({
	...bars,
	kind: z.literal('value'),
	per: z.enum(valueKinds),
	how: words,
	from: z.array(name).max(10),
	rows: z.array(z.object(bar)).max(100)
});

const dots = {
	...base,
	baseline: z.object({ profile: name, name }),
	series: z.array(z.object({ profile: name, name, series: z.number().int().min(0) })).max(60),
	rows: z
		.array(
			z.object({
				workload: name,
				name,
				kind: name,
				leastDifferencePercent: figure.nullable(),
				points: z
					.array(
						z
							.object({
								profile: name,
								gainPercent: figure,
								ci95: interval,
								ratio: figure,
								n: z.number().int().min(0),
								nBaseline: z.number().int().min(0),
								verdict: z.enum(verdicts).nullable(),
								printed: name,
								printedInterval: name.nullable()
							})
							.nullable()
					)
					.max(60)
			})
		)
		.max(100)
};
const gains = z.object({ ...dots, kind: z.literal('gains') });
const overall = z.object({ ...dots, kind: z.literal('overall'), workloads: z.array(name).max(200) });
const tradeOff = z.object({ ...dots, kind: z.literal('trade-off'), workloads: z.array(name).max(200) });

const drift = z.object({
	...base,
	kind: z.literal('drift'),
	rig: name,
	workload: name,
	unit: name,
	limits: z.object({
		centre: figure,
		sigma: figure,
		lower: figure,
		upper: figure,
		averageMovingRange: figure,
		upperMovingRange: figure
	}),
	points: z
		.array(
			z.object({
				run: z.number().int(),
				campaign: name,
				campaignName: name,
				revision: z.number().int(),
				at: name,
				number: z.number().int(),
				n: z.number().int(),
				mean: figure,
				inWindow: z.boolean(),
				movingRange: figure.nullable(),
				average: z.object({ ewma: figure, lower: figure, upper: figure }).nullable(),
				signals: z.array(name).max(10),
				begun: name.nullable()
			})
		)
		.max(2000)
});

const ladder = z.object({
	...base,
	kind: z.literal('ladder'),
	ladder: name,
	limits: z.object({ clockMHz: figure, volts: figure }),
	series: z
		.array(
			z.object({
				stress: name,
				name,
				demand: name,
				series: z.number().int().min(0),
				tries: z
					.array(
						z.object({
							clockMHz: figure,
							volts: figure,
							durationMin: figure,
							result: z.enum(ladderResults),
							failure: name,
							peakTempC: figure.nullable(),
							packageW: figure.nullable()
						})
					)
					.max(2000),
				need: z.array(z.object({ clockMHz: figure, volts: figure })).max(2000)
			})
		)
		.max(20)
});

const sweep = z.object({
	...base,
	kind: z.literal('sweep'),
	sweep: name,
	wantedMHz: figure,
	passes: z
		.array(
			z.object({
				number: z.number().int().min(1),
				series: z.number().int().min(0),
				points: z
					.array(z.object({ threads: z.number().int().min(1), currentA: figure, clockMHz: figure }))
					.max(500)
			})
		)
		.max(60),
	fit: z.array(z.object({ currentA: figure, clockMHz: figure })).max(30_000),
	crossingA: figure.nullable(),
	ci95: interval,
	setA: figure.nullable(),
	answer: name
});

/** The plates an editor's page asks to have drawn: what the renderer made of its directives. */
export const platesAsk = z.object({
	specs: z
		.array(z.discriminatedUnion('kind', [scores, gains, overall, value, tradeOff, drift, ladder, sweep]))
		.max(60, 'A page can have sixty plates at most.')
});

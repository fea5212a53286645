import { z } from 'zod';
import { directions } from '../domain/bench/words';
import { verdicts } from '../domain/bench/figures';

const words = z.string().max(1000);
const name = z.string().max(200);
const figure = z.number();
const interval = z.tuple([figure, figure]).nullable();
const base = {
	title: words,
	sub: words,
	foot: z.array(words).max(20),
	campaign: name
};

const scores = z.object({
	...base,
	kind: z.literal('scores'),
	workload: name,
	unit: name,
	better: z.enum(directions),
	rows: z
		.array(
			z.object({
				profile: name,
				name,
				series: z.number().int().min(0),
				value: figure,
				ci95: interval,
				mean: figure,
				median: figure,
				sd: figure.nullable(),
				n: z.number().int().min(0),
				printed: name,
				printedInterval: name.nullable()
			})
		)
		.max(100)
});

const gains = z.object({
	...base,
	kind: z.literal('gains'),
	baseline: z.object({ profile: name, name }),
	series: z.array(z.object({ profile: name, name, series: z.number().int().min(0) })).max(60),
	rows: z
		.array(
			z.object({
				workload: name,
				name,
				kind: name,
				leastDifferencePercent: figure,
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
								verdict: z.enum(verdicts),
								printed: name,
								printedInterval: name.nullable()
							})
							.nullable()
					)
					.max(60)
			})
		)
		.max(100)
});

/** The plates an editor's page asks to have drawn: what the renderer made of its directives. */
export const platesAsk = z.object({
	specs: z
		.array(z.discriminatedUnion('kind', [scores, gains]))
		.max(60, 'A page can have sixty plates at most.')
});

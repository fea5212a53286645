import { z } from 'zod';
import { campaignStates } from '../../../domain/bench/campaign-state';
import { costKinds } from '../../../domain/bench/cost-of';
import { verdicts } from '../../../domain/bench/figures';
import { directions } from '../../../domain/bench/words';
import { campaignInput, campaignsApiQuery, summaryQuery } from '../../../schemas/campaign';
import { runInput } from '../../../schemas/run';
import { describe } from '../openapi';
import { pageOf } from '../paging';

const interval = z.tuple([z.number(), z.number()]).nullable();
const time = z.iso.datetime();

const progress = z.object({
	taken: z.number().describe('Readings that count; a cell never counts for more than it needs.'),
	needed: z.number().describe('Readings the plan asks for.'),
	cells: z.number(),
	signed: z.number().describe('Cells that a tester signed off.')
});

const campaignItem = z.object({
	id: z.number(),
	slug: z.string(),
	name: z.string(),
	dueAt: time.nullable(),
	createdAt: time,
	state: z.enum(campaignStates),
	rig: z.object({ slug: z.string(), name: z.string(), revision: z.number() }),
	progress
});

const campaignWhole = campaignItem.extend({
	purpose: z.string(),
	rig: z.object({
		slug: z.string(),
		name: z.string(),
		revision: z.number(),
		firmware: z.string(),
		driver: z.string(),
		os: z.string()
	}),
	profiles: z.array(z.object({ slug: z.string(), name: z.string() })),
	workloads: z.array(
		z.object({
			slug: z.string(),
			name: z.string(),
			unit: z.string(),
			needed: z.number().describe('Readings each cell of this workload needs.')
		})
	)
});

const spread = {
	n: z.number().describe('Readings that count: not excluded, of runs not voided.'),
	mean: z.number().nullable().describe("Arithmetic mean, in the workload's unit."),
	median: z.number().nullable().describe("In the workload's unit."),
	sd: z
		.number()
		.nullable()
		.describe("Sample standard deviation (n − 1), in the workload's unit; null for one reading."),
	cvPercent: z.number().nullable().describe('Coefficient of variation, 100 · sd ÷ mean, in percent.'),
	ci95: interval.describe("95 % interval of the mean by Student's t, [low, high], in the workload's unit."),
	min: z.number().nullable(),
	max: z.number().nullable()
};

const verdict = z.enum(verdicts);

const comparison = z
	.object({
		ratio: z
			.number()
			.describe(
				'Ratio against the baseline, turned so that above 1 is better whichever way the quantity runs: of means, or of medians where the workload prints the median.'
			),
		ci95: interval.describe(
			'95 % interval of the ratio, [low, high]: Fieller with unequal variances for means, Price and Bonett for medians.'
		),
		gainPercent: z.number().describe('(ratio − 1) × 100.'),
		gainCi95: interval.describe('The same interval in percent.'),
		verdict: verdict.describe(
			'The verdict printed: corrected for all comparisons of the table read together (Holm), which can only turn it into `not-enough`. `better` or `worse`: the interval lies wholly beyond the least difference that matters; `no-difference`: the 90 % interval lies wholly inside it; else `not-enough` runs to say.'
		),
		alone: verdict.optional().describe('The verdict of this comparison by itself.')
	})
	.nullable()
	.describe('Null for the baseline itself, where a side has no readings, and where a ratio says nothing.');

const difference = z
	.object({
		difference: z
			.number()
			.describe("Difference of means in the workload's unit, turned so that above zero is better."),
		ci95: interval.describe('95 % interval of the difference (Welch), [low, high].'),
		least: z.number().describe("The least difference that matters, as its share of the baseline's mean."),
		verdict,
		alone: verdict,
		why: z.string().describe('Why no ratio.')
	})
	.nullable()
	.describe('In the place of a comparison where a ratio says nothing, such as degrees or decibels.');

const summary = z.object({
	campaign: z.string(),
	name: z.string(),
	baseline: z.string().describe('Slug of the profile the others are held against.'),
	together: z.number().describe('Comparisons read together: each verdict is corrected for so many.'),
	cells: z.array(
		z.object({
			profile: z.string(),
			workload: z.string(),
			unit: z.string(),
			better: z.enum(directions),
			needed: z.number(),
			...spread,
			flagged: z
				.array(z.object({ id: z.number(), value: z.number() }))
				.describe(
					"Readings that stand far from the others (Grubbs' test at 0.05, generalised ESD from 15 readings). A flag, not a removal: they count until a tester excludes them."
				),
			signedBy: z.string().nullable(),
			signedAt: time.nullable(),
			comparison,
			difference
		})
	),
	overall: z.array(
		z.object({
			profile: z.string(),
			ratio: z
				.number()
				.describe(
					"Geometric mean of the profile's ratios in the workloads that measure performance: scores, rates and times."
				),
			gainPercent: z.number(),
			ci95: interval
				.optional()
				.describe(
					'95 % interval of the geometric mean: delta method on the logarithms, Welch–Satterthwaite. It speaks of these workloads.'
				),
			gainCi95: interval.optional(),
			workloads: z.array(z.string()).describe('Workloads that went into it.'),
			missing: z.array(z.string()).describe('Performance workloads without a ratio.'),
			aside: z
				.array(z.object({ workload: z.string(), cost: z.enum(costKinds) }))
				.optional()
				.describe('Workloads left out because they measure a cost, by the kind of their unit.'),
			words: z.string().describe('What the figure rests on, what it leaves out and why, in sentences.')
		})
	)
});

const recordedRun = z.object({
	id: z.number(),
	campaign: z.string(),
	profile: z.string(),
	workload: z.string(),
	unit: z.string(),
	readings: z.array(z.object({ id: z.number(), value: z.number() })).describe('In the order sent.'),
	summary: z
		.object({
			...spread,
			flagged: z.array(z.number()),
			headline: z.number(),
			medianLogError: z
				.number()
				.nullable()
				.optional()
				.describe('Standard error of the logarithm of the median (Price and Bonett).')
		})
		.nullable()
		.describe('The cell as it stands now, with all its runs.'),
	signatureRemoved: z.boolean().describe('Whether the cell was signed off, which new readings undo.'),
	warnings: z
		.array(z.string())
		.describe(
			'Readings a hundred times and more from those there were, stored all the same: look at their unit.'
		)
});

/** Campaigns, runs and what they say. */
export const benchRun = [
	describe({
		method: 'get',
		path: '/api/v1/campaigns',
		act: 'bench.read',
		summary: 'Campaigns in the order they were made, with how far each is',
		query: campaignsApiQuery,
		response: pageOf(campaignItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/campaigns',
		act: 'bench.plan',
		summary: 'Plan a campaign: a rig as it stands now, profiles of it, workloads with their repeats',
		body: campaignInput,
		response: z.object({ id: z.number(), slug: z.string(), name: z.string() }),
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/campaigns/{campaign}',
		act: 'bench.read',
		summary: 'One campaign with its plan',
		response: campaignWhole
	}),
	describe({
		method: 'post',
		path: '/api/v1/campaigns/{campaign}/runs',
		act: 'run.record',
		summary:
			'Record a run of one cell: 1 to 1000 readings in the unit of the workload, warm-ups left out, ambient temperature in °C',
		body: runInput,
		response: recordedRun,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/campaigns/{campaign}/summary',
		act: 'bench.read',
		summary: 'Every figure of a campaign, cell by cell and overall, against a baseline; nothing is rounded',
		query: summaryQuery,
		response: summary
	})
];

import { z } from 'zod';
import { attemptOutcomes, stressKinds } from '../../../domain/bench/stability/words';
import { ladderInput, laddersApiQuery } from '../../../schemas/ladder';
import { attemptsInput, sweepInput } from '../../../schemas/stability';
import { sweepPlan, sweepsApiQuery } from '../../../schemas/sweep';
import { describe } from '../openapi';
import { pageOf } from '../paging';

const time = z.iso.datetime();
const row = { id: z.number(), slug: z.string(), name: z.string(), purpose: z.string() };
const rig = z.object({ slug: z.string(), name: z.string(), revision: z.number() });
const named = z.object({ slug: z.string(), name: z.string() });
const voided = z.string().nullable().describe('Why it was voided; null while it stands.');

const ladderItem = z.object({
	...row,
	rig,
	profile: named,
	stepMHz: z.number().describe('The board’s own step.'),
	limits: z
		.object({ clockMHz: z.number(), volts: z.number(), tempC: z.number(), source: z.string() })
		.describe('Beyond these nothing is proposed; `source` says whose they are.'),
	stresses: z.array(
		z.object({
			slug: z.string(),
			name: z.string(),
			kind: z.enum(stressKinds),
			minutes: z.number().describe('Minutes without failure that count as a pass.')
		})
	),
	highestPassed: z
		.object({ heaviestMHz: z.number().nullable(), everydayMHz: z.number().nullable() })
		.describe('Highest clock that every stress of the kind passed; null where one has passed none.'),
	attempts: z.number().describe('Attempts that stand.'),
	archived: z.boolean(),
	createdAt: time
});

const ladderWhole = ladderItem.extend({
	attempts: z
		.array(
			z.object({
				id: z.number(),
				stress: z.string(),
				stressKind: z.enum(stressKinds),
				clockMHz: z.number(),
				volts: z.number(),
				durationMin: z.number(),
				outcome: z.enum(attemptOutcomes),
				failure: z.string(),
				errors: z.number(),
				peakTempC: z.number().nullable(),
				packageW: z.number().nullable(),
				ambientC: z.number().nullable(),
				notes: z.string(),
				tester: z.string(),
				startedAt: time,
				voided
			})
		)
		.describe('The newest first, voided ones too.'),
	next: z
		.array(
			z.object({
				stress: z.string(),
				next: z
					.looseObject({
						kind: z.enum(['try', 'done', 'refused']),
						clockMHz: z.number().optional(),
						volts: z.number().optional(),
						words: z.string()
					})
					.nullable()
			})
		)
		.describe('What to try next under each stress, at the voltage of its last attempt, never over a limit.'),
	contradictions: z.array(z.string()).describe('Attempts that cannot both be right.')
});

const recordedAttempts = z.object({
	ladder: z.string(),
	attempts: z.array(z.object({ id: z.number(), key: z.string().nullable() })).describe('In the order sent.'),
	stored: z.number().describe('How many this sending brought; those sent before under the same keys stand.')
});

const sweepItem = z.object({
	...row,
	rig,
	profile: named,
	workload: named,
	wantedClockMHz: z.number().describe('The fixed clock the board would change to.'),
	currentStepA: z.number(),
	switchPoint: z
		.object({
			kind: z.enum(['crosses', 'not-reached', 'always-below']),
			crossingA: z.number().nullable().describe('Where automatic boost falls under the wanted clock, in A.'),
			ci95: z
				.tuple([z.number(), z.number()])
				.nullable()
				.describe('95 % interval over the passes (Student’s t).'),
			marginA: z.number().nullable(),
			setA: z.number().nullable().describe('What to set, on the board’s grid.'),
			words: z.string()
		})
		.nullable()
		.describe('Null before the first pass.'),
	archived: z.boolean(),
	createdAt: time
});

const sweepWhole = sweepItem.extend({
	passes: z.array(
		z.object({
			id: z.number(),
			number: z.number(),
			tester: z.string(),
			startedAt: time,
			ambientC: z.number().nullable(),
			notes: z.string(),
			points: z.array(z.object({ threads: z.number(), currentA: z.number(), clockMHz: z.number() })),
			voided
		})
	)
});

const recordedPasses = z.object({
	sweep: z.string(),
	passes: z
		.array(z.object({ id: z.number(), number: z.number(), key: z.string().nullable() }))
		.describe('In the order sent.'),
	stored: z.number().describe('How many this sending brought; those sent before under the same keys stand.')
});

/** Ladders and sweeps. */
export const benchStability = [
	describe({
		method: 'get',
		path: '/api/v1/ladders',
		act: 'bench.read',
		summary: 'Ladders in the order they were begun, with how far each was climbed',
		query: laddersApiQuery,
		response: pageOf(ladderItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/ladders',
		act: 'bench.plan',
		summary: 'Begin a ladder: a rig as it stands now, a profile of it, its stresses and limits',
		body: ladderInput,
		response: ladderWhole,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/ladders/{ladder}',
		act: 'bench.read',
		summary: 'One ladder with every attempt and what to try next',
		response: ladderWhole
	}),
	describe({
		method: 'post',
		path: '/api/v1/ladders/{ladder}/attempts',
		act: 'run.record',
		summary: 'Record attempts, all or none; clocks in MHz, core voltage in V, times in minutes',
		body: attemptsInput,
		response: recordedAttempts,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/sweeps',
		act: 'bench.read',
		summary: 'Sweeps in the order they were begun, with the switch point of each',
		query: sweepsApiQuery,
		response: pageOf(sweepItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/sweeps',
		act: 'bench.plan',
		summary: 'Begin a sweep: a rig as it stands now, a profile of it, a workload and the fixed clock wanted',
		body: sweepPlan,
		response: sweepWhole,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/sweeps/{sweep}',
		act: 'bench.read',
		summary: 'One sweep with every pass and its switch point',
		response: sweepWhole
	}),
	describe({
		method: 'post',
		path: '/api/v1/sweeps/{sweep}/passes',
		act: 'run.record',
		summary: 'Record passes, all or none: points with rising threads, current in A and clock in MHz',
		body: sweepInput,
		response: recordedPasses,
		status: 201
	})
];

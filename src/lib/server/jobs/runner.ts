import { randomUUID } from 'node:crypto';
import { retryDelayMs } from '../../domain/jobs/retry-delay';
import { clock } from '../clock';
import type { SystemContext } from '../context';
import * as jobs from '../db/queries/jobs';
import type { ClaimedJob } from '../db/queries/jobs';
import { log } from '../log';
import type { JobHandler, JobTools } from './handler';
import { enqueue } from './queue';
import { handlers as everyHandler, recurring } from './registry';

const leaseMs = 60_000;
const batch = 8;

export interface Work {
	tools: JobTools;
	handlers?: Record<string, JobHandler>;
	/** This worker's name in the leases. */
	name?: string;
	/** From 0 to 1, spreads retries. */
	jitter?: () => number;
}

const wordsOf = (error: unknown) =>
	(error instanceof Error ? `${error.name}: ${error.message}` : String(error)).slice(0, 2000);

async function runOne(
	ctx: SystemContext,
	claimed: ClaimedJob,
	{ tools, handlers = everyHandler, name, jitter = Math.random }: Work & { name: string }
): Promise<void> {
	try {
		const handler = handlers[claimed.kind];
		if (!handler) throw new Error(`Nothing here does jobs of the kind ${claimed.kind}.`);
		// Each attempt before ended without a word: what kills its process is not tried for ever.
		if (claimed.attempts > claimed.maxAttempts)
			throw new Error('The process that did this job ended in the middle of it, at every attempt.');
		await handler(ctx, claimed.payload, tools);
		await jobs.finish(ctx.db, claimed, name, ctx.now);
	} catch (error) {
		const givenUp = claimed.attempts >= claimed.maxAttempts;
		log[givenUp ? 'error' : 'warn'](
			{ job: claimed.id, kind: claimed.kind, attempt: claimed.attempts, error: wordsOf(error) },
			givenUp ? 'a job was given up' : 'a job failed and will be tried again'
		);
		const runAt = givenUp ? null : new Date(ctx.now.getTime() + retryDelayMs(claimed.attempts, jitter()));
		await jobs.fail(ctx.db, claimed, name, { runAt, error: wordsOf(error), now: ctx.now });
	}
}

/** Takes one batch of what is due and does it. @returns how many attempts were made */
async function runBatch(ctx: SystemContext, work: Work & { name: string }): Promise<number> {
	const claimed = await jobs.claim(ctx.db, ctx.now, {
		name: work.name,
		until: new Date(ctx.now.getTime() + leaseMs),
		limit: batch
	});
	await Promise.all(claimed.map((one) => runOne(ctx, one, work)));
	return claimed.length;
}

/**
 * Runs what is due now, batch after batch, until nothing is; what falls due later waits.
 * @returns how many attempts were made
 */
export async function runDue(ctx: SystemContext, work: Work): Promise<number> {
	const named = { ...work, name: work.name ?? randomUUID() };
	let total = 0;
	for (let made = 1; made > 0; total += made) made = await runBatch(ctx, named);
	return total;
}

/** Queues the recurring jobs of the current period; whoever comes second finds them there. */
export const queueRecurring = (ctx: SystemContext): Promise<void> =>
	enqueue(
		ctx.db,
		ctx.now,
		recurring.map(({ kind, everyMs }) => ({
			kind,
			payload: {},
			runAt: ctx.now,
			dedupeKey: `${kind}:${Math.floor(ctx.now.getTime() / everyMs)}`
		}))
	);

export interface Runner {
	/** Takes nothing new, and ends when what is under way has ended. */
	stop: () => Promise<void>;
	/** When it last looked for work without an error; null before the first time. */
	lastLook: () => Date | null;
}

const pollMs = 500;

/** Works on jobs until it is stopped: looks twice a second, so that what has a time goes out within the second. */
export function startRunner(base: Omit<SystemContext, 'now'>, tools: JobTools): Runner {
	const name = randomUUID();
	let stopped = false;
	let timer: NodeJS.Timeout | undefined;
	let last: Date | null = null;
	let minute = 0;

	const look = async () => {
		try {
			const now = clock.now();
			// The periods are hours and days: asking once a minute is often enough.
			if (Math.floor(now.getTime() / 60_000) !== minute) await queueRecurring({ ...base, now });
			minute = Math.floor(now.getTime() / 60_000);
			// The time is read for each batch: a lease counts from when its work begins, however long the queue is.
			do last = clock.now();
			while ((await runBatch({ ...base, now: clock.now() }, { tools, name })) > 0 && !stopped);
		} catch (error) {
			log.error({ error: wordsOf(error) }, 'the job runner could not look for work');
		}
	};
	let looking = Promise.resolve();
	const again = () => {
		if (stopped) return;
		looking = look().finally(() => {
			if (!stopped) timer = setTimeout(again, pollMs);
		});
	};
	again();

	return {
		stop: async () => {
			stopped = true;
			clearTimeout(timer);
			await looking;
		},
		lastLook: () => last
	};
}

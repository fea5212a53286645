import * as idempotency from '../db/queries/idempotency';
import * as jobs from '../db/queries/jobs';
import type { JobHandler } from './handler';

const dayMs = 86_400_000;

/** Clears away what has served: keys of a day ago, finished jobs of a month ago. */
export const sweep: JobHandler = async (ctx) => {
	await idempotency.sweep(ctx.db, new Date(ctx.now.getTime() - dayMs));
	await jobs.sweepDone(ctx.db, new Date(ctx.now.getTime() - 30 * dayMs));
};

import * as idempotency from '../db/queries/idempotency';
import * as jobs from '../db/queries/jobs';
import * as sessions from '../db/queries/sessions';
import type { JobHandler } from './handler';

const dayMs = 86_400_000;

/** Clears away what has served: keys of a day ago, sessions and links that have run out, finished jobs of a month ago. */
export const sweep: JobHandler = async (ctx) => {
	await idempotency.sweep(ctx.db, new Date(ctx.now.getTime() - dayMs));
	await sessions.sweep(ctx.db, ctx.now);
	await jobs.sweepDone(ctx.db, new Date(ctx.now.getTime() - 30 * dayMs));
};

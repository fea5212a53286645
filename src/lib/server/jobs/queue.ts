import type { Db } from '../db/client';
import { job } from '../db/schema';

/** What a service may ask to be done after its transaction; each kind has a file in this folder. */
export interface JobRequest {
	kind: string;
	payload: Record<string, unknown>;
	/** Not before this moment. */
	runAt: Date;
	/** The same key is queued once, however often it is asked for. */
	dedupeKey?: string;
}

/** Queues work in the caller's transaction, so that it exists exactly when what it follows from does. */
export async function enqueue(db: Db, now: Date, requests: JobRequest[]): Promise<void> {
	if (requests.length === 0) return;
	await db
		.insert(job)
		.ignore()
		.values(
			requests.map(({ kind, payload, runAt, dedupeKey }) => ({
				kind,
				payload,
				runAt,
				dedupeKey: dedupeKey ?? null,
				createdAt: now
			}))
		);
}

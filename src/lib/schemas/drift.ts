import { z } from 'zod';

const slug = z.string().trim().max(80).optional().catch(undefined);
const number = z.coerce.number().int().min(1).max(100_000).optional().catch(undefined);

/** What the page of drift is asked for; what cannot be read is left to what is usual. */
export const driftQuery = z.object({ rig: slug, workload: slug, from: number, to: number });
export type DriftQuery = z.infer<typeof driftQuery>;

import { z } from 'zod';

/** Labels on one sheet. */
export const labelsPerSheet = 60;

/** What is looked for by its code. */
export const scanQuery = z.object({ code: z.string().trim().max(400).catch('').default('') });

/** The samples whose labels are printed. */
export const labelsQuery = z.array(z.string().trim().min(1).max(80)).max(labelsPerSheet);

import { z } from 'zod';
import { paces } from '../domain/articles/narration/pace';

/** At how many words a minute a script is read. */
export const paceQuery = z.object({
	pace: z.coerce.number().int().min(paces.least).max(paces.most).catch(paces.usual).default(paces.usual)
});

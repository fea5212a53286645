import { publishDue } from '../services/articles/publish-article';
import type { JobHandler } from './handler';

/** Publishes the article whose slot has come; what is not scheduled any more, or not for now, is let be. */
export const publishScheduled: JobHandler = async (ctx, { articleId, editionId }) => {
	await publishDue(ctx, { articleId: Number(articleId), editionId: Number(editionId) });
};

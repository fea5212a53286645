import { wholeText, wordsBetween } from '../../../domain/articles/revisions/words-between';
import type { Context } from '../../context';
import type { Transaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as filing from '../../db/queries/article-filing';
import * as audit from '../../db/queries/audit';
import * as revisions from '../../db/queries/revision';

export interface NewArticle {
	slug: string;
	title: string;
	standfirst: string;
	template: string;
	source: string;
	campaignIds: number[];
	/** Where its first revision comes from. */
	note: string;
	/** What the audit log says besides. */
	log: Record<string, unknown>;
}

/** Writes an article of the actor's with its first revision; a taken address is the database's duplicate error. */
export async function createArticle(ctx: Context, tx: Transaction, made: NewArticle): Promise<number> {
	const { slug, title, standfirst, template, source, campaignIds, note, log } = made;
	const id = await articles.insert(tx, {
		...{ slug, title, standfirst, template },
		...{ stage: 'drafting', authorId: ctx.actor.id, head: 1, createdAt: ctx.now, updatedAt: ctx.now }
	});
	await articles.setCampaigns(tx, id, campaignIds);
	await revisions.insert(tx, {
		...{ articleId: id, number: 1, title, standfirst, source, note },
		...{ savedBy: ctx.actor.id, savedAt: ctx.now },
		wordsAdded: wordsBetween('', wholeText({ title, standfirst, source })).added,
		wordsRemoved: 0
	});
	await filing.putText(tx, { articleId: id, title, standfirst, source });
	await audit.append(tx, [
		{
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'article.start',
			subjectKind: 'article',
			subjectId: id,
			after: { slug, title, template, ...log }
		}
	]);
	return id;
}

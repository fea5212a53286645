import type { HandoverFacts } from '../../../domain/mail/article-handover';
import type { Letter } from '../../../domain/mail/letter';
import type { SystemContext } from '../../context';
import type { Transaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import type { Recipient } from '../../db/queries/handover';
import * as handover from '../../db/queries/handover';
import * as settings from '../../db/queries/settings';
import { post } from '../../jobs/outbox';

/** What one group of people is told. */
export interface Telling {
	to: Recipient[];
	letter: (facts: HandoverFacts) => Letter;
}

/**
 * Puts the mails of one event into the outbox, in the caller's transaction. Whoever did it is not told, and
 * nobody is told twice: the first group that has a person counts. The same event makes the same message ids.
 */
export async function tell(
	ctx: SystemContext & { actor?: { id: string; name: string } },
	tx: Transaction,
	row: ArticleRow,
	event: string,
	tellings: Telling[]
): Promise<void> {
	const [author] = await handover.personById(tx, row.authorId);
	const { name: publication } = await settings.publication(tx);
	const base = `${ctx.origin}/desk/articles/${row.slug}`;
	const facts: HandoverFacts = {
		title: row.title,
		by: ctx.actor?.name ?? publication,
		author: author?.name ?? 'somebody who has left',
		reviewHref: `${base}/review`,
		editHref: base,
		publicHref: `${ctx.origin}/articles/${row.slug}`,
		publication
	};
	const told = new Set(ctx.actor ? [ctx.actor.id] : []);
	const mails = tellings.flatMap(({ to, letter }) => {
		const due = to.filter((person) => !told.has(person.id));
		for (const person of due) told.add(person.id);
		const words = letter(facts);
		return due.map((person) => ({
			messageId: `article-${row.id}.${event}.${person.id}@${new URL(ctx.origin).hostname}`,
			recipient: person.email,
			...words
		}));
	});
	await post(tx, ctx.now, mails);
}

import type { Capacity, HandoverFacts } from '../../../domain/mail/article-handover';
import type { Letter } from '../../../domain/mail/letter';
import type { SystemContext } from '../../context';
import type { Transaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import * as handover from '../../db/queries/handover';
import { tell } from './tell';

/** Tells the author and the testers of what happened to the readers' page, and the liaison where a lent sample is in it. */
export async function tellReaders(
	ctx: SystemContext & { actor?: { id: string; name: string } },
	tx: Transaction,
	row: ArticleRow,
	event: string,
	letters: {
		desk: (facts: HandoverFacts, capacity: Capacity) => Letter;
		liaison?: (facts: HandoverFacts) => Letter;
	}
): Promise<void> {
	const { desk, liaison } = letters;
	const lent = liaison !== undefined && (await handover.usesLentSamples(tx, row.id));
	await tell(ctx, tx, row, event, [
		{ to: await handover.personById(tx, row.authorId), letter: (facts) => desk(facts, 'author') },
		{ to: await handover.testersOf(tx, row.id), letter: (facts) => desk(facts, 'tester') },
		...(lent ? [{ to: await handover.withRole(tx, 'liaison'), letter: liaison }] : [])
	]);
}

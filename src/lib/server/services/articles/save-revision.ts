import { after, closedWords } from '../../../domain/articles/stage';
import { wholeText, wordsBetween } from '../../../domain/articles/revisions/words-between';
import * as mails from '../../../domain/mail/article-handover';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { RevisionSave } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction, type Transaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import * as articles from '../../db/queries/article';
import * as filing from '../../db/queries/article-filing';
import * as audit from '../../db/queries/audit';
import * as editions from '../../db/queries/edition';
import * as handover from '../../db/queries/handover';
import * as revisions from '../../db/queries/revision';
import { forbiddenWords } from './take-article';
import { tell } from './tell';

export interface Saved {
	revision: number;
	savedAt: Date;
	/** False when the text was the newest revision's already, and nothing was written. */
	changed: boolean;
	stage: ArticleRow['stage'];
	version: number;
	/** Whether this save took an approval off. */
	approvalTakenOff: boolean;
}

/** The revision somebody else saved meanwhile, for the difference. */
export interface NewerRevision {
	number: number;
	title: string;
	standfirst: string;
	source: string;
	savedAt: Date;
	savedByName: string;
	/** The revision that both were written on, to put the two together by; null where there is none of that number. */
	base: Pick<RevisionSave, 'title' | 'standfirst' | 'source'> | null;
}

/**
 * Saves a text as the article's next revision. Over a newer revision than the one it was written on it is refused
 * as a conflict, with that revision as `detail`; the text that is already newest makes no revision. On an approved
 * or scheduled article the save takes the approval off and tells the people who counted on it.
 */
export const saveRevision = (
	ctx: Context,
	slug: string,
	input: RevisionSave,
	note = ''
): Promise<Outcome<Saved, 'not_found' | 'forbidden' | 'conflict'>> =>
	inTransaction(ctx.db, (tx) => saveRevisionIn(ctx, tx, slug, input, note));

/** The same inside a transaction that has more to do. */
export async function saveRevisionIn(
	ctx: Context,
	tx: Transaction,
	slug: string,
	input: RevisionSave,
	note: string
): Promise<Outcome<Saved, 'not_found' | 'forbidden' | 'conflict'>> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const row = await articles.lockBySlug(tx, slug);
	if (!row) return refuse('not_found', 'There is no such article.');
	if (!may(ctx.actor, 'article.edit', { authorId: row.authorId }))
		return refuse('forbidden', forbiddenWords(ctx, 'article.edit', row.authorId));
	const stage = after(row.stage, 'edit');
	if (!stage) return refuse('conflict', closedWords(row.stage, 'edit'));
	const head = await revisions.byNumber(tx, row.id, row.head);
	if (!head) throw new Error(`Article ${row.id} has no revision ${row.head}.`);
	const same =
		head.title === input.title && head.standfirst === input.standfirst && head.source === input.source;
	if (same)
		return done({
			revision: head.number,
			savedAt: head.savedAt,
			changed: false,
			stage: row.stage,
			version: row.version,
			approvalTakenOff: false
		});
	if (row.head !== input.basedOn) {
		const { number, title, standfirst, source, savedAt, savedByName } = head;
		const base = await baseOf(tx, row.id, input.basedOn);
		return refuse(
			'conflict',
			`${savedByName} saved revision ${number} after you began from revision ${input.basedOn}. Yours is not saved yet, and nothing of it is lost: choose what to keep.`,
			{ detail: { number, title, standfirst, source, savedAt, savedByName, base } satisfies NewerRevision }
		);
	}
	return done(await write(ctx, tx, row, stage, input, note, head));
}

async function baseOf(tx: Transaction, articleId: number, number: number): Promise<NewerRevision['base']> {
	const found = await revisions.byNumber(tx, articleId, number);
	return found ? { title: found.title, standfirst: found.standfirst, source: found.source } : null;
}

async function write(
	ctx: Context,
	tx: Transaction,
	row: ArticleRow,
	stage: ArticleRow['stage'],
	input: RevisionSave,
	note: string,
	head: Pick<RevisionSave, 'title' | 'standfirst' | 'source'>
): Promise<Saved> {
	const number = row.head + 1;
	const words = wordsBetween(wholeText(head), wholeText(input));
	const { title, standfirst, source } = input;
	await revisions.insert(tx, {
		articleId: row.id,
		number,
		title,
		standfirst,
		source,
		savedBy: ctx.actor.id,
		savedAt: ctx.now,
		note,
		wordsAdded: words.added,
		wordsRemoved: words.removed
	});
	await filing.putText(tx, { articleId: row.id, title, standfirst, source });
	await articles.update(tx, row.id, row.version, {
		title,
		standfirst,
		head: number,
		stage,
		approvedEditionId: null,
		updatedAt: ctx.now
	});
	const approvalTakenOff = row.approvedEditionId !== null;
	if (approvalTakenOff) await takeApprovalOff(ctx, tx, row, number);
	return {
		revision: number,
		savedAt: ctx.now,
		changed: true,
		stage,
		version: row.version + 1,
		approvalTakenOff
	};
}

/** Logs that an approval is off, and tells the author, whoever approved, and, of a slot lost, the editors. */
export async function takeApprovalOff(
	ctx: Context,
	tx: Transaction,
	row: ArticleRow,
	revisionNumber: number | null
): Promise<void> {
	const edition = row.approvedEditionId === null ? undefined : await editions.byId(tx, row.approvedEditionId);
	await audit.append(tx, [
		{
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'article.edit',
			subjectKind: 'article',
			subjectId: row.id,
			before: { stage: row.stage, approvedEdition: edition?.number ?? null },
			after: { stage: 'in-review', revision: revisionNumber },
			reason: 'A change to the text takes the approval off.'
		}
	]);
	const approver = edition ? await handover.personById(tx, edition.approvedBy) : [];
	const editors = row.stage === 'scheduled' ? await handover.withRole(tx, 'editor') : [];
	await tell(ctx, tx, row, `approval-off.v${row.version}`, [
		{
			to: await handover.personById(tx, row.authorId),
			letter: (facts) => mails.approvalTakenOff(facts, 'author')
		},
		{ to: [...approver, ...editors], letter: (facts) => mails.approvalTakenOff(facts, 'editor') }
	]);
}

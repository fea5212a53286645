import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PictureWords } from '../../../schemas/picture';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as pictures from '../../db/queries/picture';
import {
	enterPictures,
	readyPictures,
	storedOf,
	subjectOf,
	type SentPicture,
	type StoredPicture
} from './take-in-picture';

const notYours = 'Only testers, writers and editors put pictures in.';

/**
 * Takes a picture in: once, however often and by whomever the same file is sent. What is kept is upright, scaled, and
 * without the place it was taken at.
 */
export async function storePicture(
	ctx: Context,
	sent: SentPicture
): Promise<Outcome<StoredPicture, 'forbidden' | 'invalid' | 'too_many'>> {
	if (!may(ctx.actor, 'picture.store')) return refuse('forbidden', notYours);
	const ready = await readyPictures(ctx, [sent], false);
	if (!ready.ok) return ready;
	const [first] = ready.value;
	if (!first) throw new Error('Of one picture none was made ready.');
	const { row, known, notes } = first;
	try {
		await inTransaction(ctx.db, (tx) => enterPictures(ctx, tx, [first]));
		return done(storedOf(row, known, notes));
	} catch (error) {
		// Somebody sent the same file at the same moment.
		const theirs = isDuplicate(error) && (await pictures.byHash(ctx.db, row.sha256));
		if (!theirs) throw error;
		return done(storedOf(theirs, true, notes));
	}
}

/** Says what a picture shows and whose it is; articles keep the text they were written with. */
export const describePicture = (
	ctx: Context,
	hash: string,
	words: Partial<PictureWords>
): Promise<Outcome<StoredPicture, 'forbidden' | 'not_found'>> =>
	inTransaction(ctx.db, async (tx) => {
		if (!may(ctx.actor, 'picture.store')) return refuse('forbidden', notYours);
		const row = await pictures.byHash(tx, hash);
		if (!row) return refuse('not_found', 'There is no such picture.');
		const before = { alt: row.alt, credit: row.credit };
		const after = { ...before, ...words };
		if (after.alt === before.alt && after.credit === before.credit) return done(storedOf(row, true));
		await pictures.describe(tx, row.sha256, after);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'picture.describe',
				subjectKind: 'picture',
				subjectId: subjectOf(row.sha256),
				before,
				after
			}
		]);
		return done(storedOf({ ...row, ...after }, true));
	});

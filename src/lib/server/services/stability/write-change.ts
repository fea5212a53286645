import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { Context } from '../../context';
import { inTransaction, type Db } from '../../db/client';
import * as audit from '../../db/queries/audit';

interface Kept {
	id: number;
	slug: string;
	version: number;
}

/** Where rows of a kind are found, held and written. */
export interface Place<Row extends Kept, Change> {
	kind: 'ladder' | 'sweep';
	find: (ctx: Pick<Context, 'db'>, ref: string) => Promise<Outcome<{ id: number }, 'not_found'>>;
	lock: (db: Db, id: number) => Promise<Row | undefined>;
	update: (db: Db, id: number, seen: number, change: Change) => Promise<boolean>;
}

/** Writes a change over the version that was seen, with what stood there before in the history. */
export async function writeChange<Row extends Kept, Change extends object>(
	ctx: Context,
	{ kind, find, lock, update }: Place<Row, Change>,
	{ ref, act, version, change }: { ref: string; act: string; version: number; change: Change }
): Promise<Outcome<{ slug: string }>> {
	return inTransaction(ctx.db, async (tx) => {
		const found = await find({ db: tx }, ref);
		if (!found.ok) return found;
		const before = await lock(tx, found.value.id);
		if (!before) return refuse('not_found', `There is no ${kind} “${ref}” on the bench.`);
		if (!(await update(tx, before.id, version, change))) return changedMeanwhile(kind, before.version);
		const was = Object.fromEntries(
			Object.keys(change).map((key) => [key, before[key as keyof typeof before]])
		);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: `${kind}.${act}`,
				subjectKind: kind,
				subjectId: before.id,
				before: was,
				after: change
			}
		]);
		return done({ slug: before.slug });
	});
}

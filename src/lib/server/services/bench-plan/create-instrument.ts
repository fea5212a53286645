import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugMissing, slugTaken } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { InstrumentInput } from '../../../schemas/instrument';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as instruments from '../../db/queries/instrument';

/** Writes an instrument down with its limits of error. */
export async function createInstrument(
	ctx: Context,
	input: InstrumentInput
): Promise<Outcome<{ id: number; slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers write instruments down.');
	const slug = input.slug || slugOf(input.name);
	if (slug === '' || isReserved(slug)) return slugMissing();
	const row = {
		...input,
		slug,
		calibratedOn: input.calibratedOn || null,
		calibrationDueOn: input.calibrationDueOn || null
	};
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const id = await instruments.insert(tx, { ...row, createdAt: ctx.now });
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'instrument.create',
					subjectKind: 'instrument',
					subjectId: id,
					after: row
				}
			]);
			return done({ id, slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('instrument', slug);
		throw error;
	}
}

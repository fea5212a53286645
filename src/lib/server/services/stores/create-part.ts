import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { PartInput } from '../../../schemas/part';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as prices from '../../db/queries/part-price';
import * as parts from '../../db/queries/part';
import { notYetSeen } from './add-part-price';
import { slugMissing, slugTaken } from '../../../domain/shared/refusals';

/** Puts a new part into the stores, with the prices already seen of it. */
export async function createPart(
	ctx: Context,
	input: PartInput
): Promise<Outcome<{ id: number; slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'stores.edit')) return refuse('forbidden', 'Only testers and liaisons add parts.');
	const slug = input.slug || slugOf(`${input.maker} ${input.model}`);
	if (slug === '' || isReserved(slug)) return slugMissing();
	const early = input.prices.findIndex((price) => notYetSeen(ctx.now, price.observedOn));
	if (early >= 0)
		return refuse('invalid', 'A price has a date still to come. Nothing was saved.', {
			fields: { [`prices.${early}.observedOn`]: ['This day is still to come.'] }
		});
	const { kind, maker, model, specification } = input;
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const id = await parts.insert(tx, { slug, kind, maker, model, specification, createdAt: ctx.now });
			await prices.insert(
				tx,
				input.prices.map((price) => ({ ...price, partId: id, createdAt: ctx.now }))
			);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'part.create',
					subjectKind: 'part',
					subjectId: id,
					after: { ...input, slug }
				}
			]);
			return done({ id, slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('part', slug);
		throw error;
	}
}

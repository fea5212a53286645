import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugMaxLength } from '../../../domain/shared/slug';
import type { SampleInput } from '../../../schemas/sample';
import type { Context } from '../../context';
import { inTransaction, isDuplicate, type Db } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as parts from '../../db/queries/part';
import * as samples from '../../db/queries/sample';
import { slugTaken } from '../../../domain/shared/refusals';

/** The part's slug with the next number that no sample has: aldermoor-1650-3. */
async function nextCode(db: Db, partSlug: string): Promise<string> {
	const stem = partSlug.slice(0, slugMaxLength - 8).replace(/-+$/, '');
	const taken = await samples.codesLike(db, stem);
	const numbers = taken.map((code) => Number(code.slice(stem.length + 1))).filter(Number.isInteger);
	return `${stem}-${Math.max(0, ...numbers) + 1}`;
}

/** Takes a physical unit of a part into the stores. */
export async function createSample(
	ctx: Context,
	input: SampleInput,
	attempt = 1
): Promise<Outcome<{ id: number; slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'stores.edit')) return refuse('forbidden', 'Only testers and liaisons add samples.');
	let slug = input.slug;
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const [part] = await parts.byRefs(tx, [input.part]);
			if (!part)
				return refuse('invalid', 'Nothing was saved: the part is not in the stores.', {
					fields: { part: [`There is no part “${input.part}”. Add the part first.`] }
				});
			slug = input.slug || (await nextCode(tx, part.slug));
			const { serial, provenance, condition, place } = input;
			const row = { slug, partId: part.id, serial, provenance, condition, place };
			const id = await samples.insert(tx, { ...row, createdAt: ctx.now });
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'sample.create',
					subjectKind: 'sample',
					subjectId: id,
					after: row
				}
			]);
			return done({ id, slug });
		});
	} catch (error) {
		// Two people asked for the next number at once: the later one takes the number after.
		if (isDuplicate(error) && input.slug === '' && attempt < 5) return createSample(ctx, input, attempt + 1);
		if (isDuplicate(error)) return slugTaken('sample', slug);
		throw error;
	}
}

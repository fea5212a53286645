import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugOf } from '../../../domain/shared/slug';
import type { PartnerInput } from '../../../schemas/partner';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as partners from '../../db/queries/partner';

const taken = refuse('conflict', 'A partner of this name is here already.', {
	fields: { name: ['A partner of this name is here already.'] }
});

/** Adds an organisation we deal with. */
export async function addPartner(
	ctx: Context,
	input: PartnerInput
): Promise<Outcome<{ slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'partner.edit')) return refuse('forbidden', 'Only a liaison adds partners.');
	const name = slugOf(input.name);
	// The application's own pages stand beside the partners'.
	const slug = ['new', 'loans'].includes(name) ? `${name}-partner` : name;
	if (slug === '')
		return refuse(
			'invalid',
			'Spell the name with some letters a to z as well: its address is made from it.',
			{ fields: { name: ['Spell it with some letters a to z as well: the address is made from it.'] } }
		);
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const id = await partners.insert(tx, { ...input, slug, createdAt: ctx.now });
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'partner.add',
					subjectKind: 'partner',
					subjectId: id,
					after: input
				}
			]);
			return done({ slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return taken;
		throw error;
	}
}

/** Changes what we know of a partner; its address stays. */
export async function editPartner(
	ctx: Context,
	slug: string,
	version: number,
	input: PartnerInput
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'partner.edit')) return refuse('forbidden', 'Only a liaison changes partners.');
	return inTransaction(ctx.db, async (tx) => {
		const before = await partners.bySlug(tx, slug);
		if (!before) return refuse('not_found', 'There is no such partner.');
		if (!(await partners.update(tx, before.id, version, input))) {
			return refuse(
				'conflict',
				'Somebody else changed this partner meanwhile. What you typed is kept below; look at theirs and save again.',
				{ detail: { version: before.version } }
			);
		}
		const { name, contactName, contactEmail, notes } = before;
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'partner.edit',
				subjectKind: 'partner',
				subjectId: before.id,
				before: { name, contactName, contactEmail, notes },
				after: input
			}
		]);
		return done({ slug });
	});
}

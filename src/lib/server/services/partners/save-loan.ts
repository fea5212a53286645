import { may } from '../../../domain/people/policy';
import { minorUnits } from '../../../domain/shared/money';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { LoanEdit, LoanInput } from '../../../schemas/partner';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as loans from '../../db/queries/loan';
import * as partners from '../../db/queries/partner';
import * as samples from '../../db/queries/sample';

/** The typed value in minor units, or why it is none. */
function valueOf(input: {
	value: string;
	currency: string;
}): Outcome<{ valueMinor: number | null; currency: string | null }, 'invalid'> {
	if (input.value === '') return done({ valueMinor: null, currency: null });
	const amount = minorUnits(input.value, input.currency);
	if (!amount.ok) return refuse('invalid', amount.message, { fields: { value: [amount.message] } });
	return done({ valueMinor: amount.amountMinor, currency: input.currency });
}

/** Asks a partner for samples: the loan begins. */
export async function askForLoan(
	ctx: Context,
	partnerSlug: string,
	input: LoanInput
): Promise<Outcome<{ id: number }, 'forbidden' | 'not_found' | 'invalid'>> {
	if (!may(ctx.actor, 'loan.edit')) return refuse('forbidden', 'Only a liaison opens loans.');
	const value = valueOf(input);
	if (!value.ok) return value;
	return inTransaction(ctx.db, async (tx) => {
		const partner = await partners.bySlug(tx, partnerSlug);
		if (!partner) return refuse('not_found', 'There is no such partner.');
		const found = await samples.byRefs(tx, input.samples);
		const missing = input.samples.filter((slug) => !found.some((sample) => sample.slug === slug));
		if (missing.length > 0)
			return refuse('invalid', `There is no sample ${missing.join(', ')}.`, {
				fields: { samples: [`There is no sample ${missing.join(', ')}.`] }
			});
		const { terms, disclosure } = input;
		const row = {
			partnerId: partner.id,
			stage: 'asked-for' as const,
			terms,
			disclosure,
			askedOn: input.askedOn || null,
			dueOn: input.dueOn || null,
			...value.value,
			createdBy: ctx.actor.id,
			createdAt: ctx.now
		};
		const id = await loans.insert(
			tx,
			row,
			found.map((sample) => sample.id)
		);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'loan.ask',
				subjectKind: 'loan',
				subjectId: id,
				after: { partner: partner.name, ...input }
			}
		]);
		return done({ id });
	});
}

/** Changes a loan's date, terms, disclosure or value. */
export async function editLoan(
	ctx: Context,
	id: number,
	input: LoanEdit
): Promise<Outcome<{ id: number }, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'loan.edit')) return refuse('forbidden', 'Only a liaison changes loans.');
	const value = valueOf(input);
	if (!value.ok) return value;
	return inTransaction(ctx.db, async (tx) => {
		const before = await loans.lock(tx, id);
		if (!before) return refuse('not_found', 'There is no such loan.');
		if (input.dueOn && before.receivedOn && input.dueOn < before.receivedOn) {
			return refuse('invalid', 'The due date is before the day it came.', {
				fields: { dueOn: ['This is before the day it came.'] }
			});
		}
		const change = {
			dueOn: input.dueOn || null,
			terms: input.terms,
			disclosure: input.disclosure,
			...value.value
		};
		if (!(await loans.update(tx, id, input.version, change))) {
			return refuse(
				'conflict',
				'Somebody else changed this loan meanwhile. What you typed is kept below; look at theirs and save again.',
				{ detail: { version: before.version } }
			);
		}
		const { dueOn, terms, disclosure, valueMinor, currency } = before;
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'loan.edit',
				subjectKind: 'loan',
				subjectId: id,
				before: { dueOn, terms, disclosure, valueMinor, currency },
				after: change
			}
		]);
		return done({ id });
	});
}

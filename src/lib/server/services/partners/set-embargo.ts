import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { EmbargoInput, EmbargoLift } from '../../../schemas/partner';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as embargoes from '../../db/queries/embargo';
import * as loans from '../../db/queries/loan';

/** A local time as the moment it names; refused where the clocks skip it or the zone is unknown. */
function moment(local: string, zone: string): Outcome<Date, 'invalid'> {
	const read = DateTime.fromISO(local, { zone });
	if (read.invalidReason === 'unsupported zone')
		return refuse('invalid', `There is no time zone ${zone}.`, {
			fields: { zone: ['There is no such time zone; write it as Continent/City.'] }
		});
	if (!read.isValid || read.toFormat("yyyy-MM-dd'T'HH:mm") !== local) {
		return refuse('invalid', 'This time does not exist there: the clocks are put forward over it.', {
			fields: {
				until: [
					'This time does not exist there: the clocks are put forward over it, or there is no such date.'
				]
			}
		});
	}
	return done(read.toJSDate());
}

/** Holds back a sample's specification, results, or both until a moment, by the terms of its loan. */
export async function setEmbargo(
	ctx: Context,
	loanId: number,
	input: EmbargoInput
): Promise<Outcome<{ id: number }, 'forbidden' | 'not_found' | 'invalid'>> {
	if (!may(ctx.actor, 'loan.edit')) return refuse('forbidden', 'Only a liaison sets embargoes.');
	const until = moment(input.until, input.zone);
	if (!until.ok) return until;
	return inTransaction(ctx.db, async (tx) => {
		const sample = (await loans.samplesOf(tx, [loanId])).find((s) => s.slug === input.sample);
		if (!sample) return refuse('not_found', 'This loan has no such sample.');
		const id = await embargoes.insert(tx, {
			sampleId: sample.sampleId,
			loanId,
			field: input.field,
			until: until.value,
			note: input.note,
			createdAt: ctx.now
		});
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'embargo.set',
				subjectKind: 'loan',
				subjectId: loanId,
				after: {
					embargo: id,
					sample: sample.slug,
					field: input.field,
					until: until.value.toISOString(),
					note: input.note
				}
			}
		]);
		return done({ id });
	});
}

/** Lifts an embargo before its time, with the reason. It stays on record. */
export async function liftEmbargo(
	ctx: Context,
	loanId: number,
	input: EmbargoLift
): Promise<Outcome<{ id: number }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'loan.edit')) return refuse('forbidden', 'Only a liaison lifts embargoes.');
	return inTransaction(ctx.db, async (tx) => {
		const before = await embargoes.lock(tx, input.embargo);
		if (before?.loanId !== loanId) return refuse('not_found', 'This loan has no such embargo.');
		if (before.liftedAt) return refuse('conflict', 'This embargo was lifted already.');
		await embargoes.lift(tx, before.id, {
			liftedAt: ctx.now,
			liftedBy: ctx.actor.id,
			liftReason: input.reason
		});
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'embargo.lift',
				subjectKind: 'loan',
				subjectId: loanId,
				before: { embargo: before.id, until: before.until.toISOString() },
				after: { liftedAt: ctx.now.toISOString() },
				reason: input.reason
			}
		]);
		return done({ id: before.id });
	});
}

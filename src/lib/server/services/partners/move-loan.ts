import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { afterMove, closedStages, loanMoveWords, loanStageWords } from '../../../domain/stores/loan';
import type { LoanStage } from '../../../domain/stores/words';
import type { LoanMoveInput } from '../../../schemas/partner';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as loans from '../../db/queries/loan';
import { publication } from '../../db/queries/settings';

/** Takes a loan one step on, on the day it happened: today, in the publication's zone, when none is given. */
export async function moveLoan(
	ctx: Context,
	id: number,
	input: LoanMoveInput
): Promise<Outcome<{ stage: LoanStage }, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'loan.edit')) return refuse('forbidden', 'Only a liaison moves loans.');
	return inTransaction(ctx.db, async (tx) => {
		const before = await loans.lock(tx, id);
		if (!before) return refuse('not_found', 'There is no such loan.');
		const stage = afterMove(before.stage, input.move);
		if (!stage)
			return refuse(
				'conflict',
				`“${loanMoveWords[input.move]}” does not follow: the loan is ${loanStageWords[before.stage]}. Nothing was changed.`
			);
		const { zone } = await publication(tx);
		const on = input.on || DateTime.fromJSDate(ctx.now, { zone }).toISODate();
		const dates =
			stage === 'here' ? { receivedOn: on } : closedStages.includes(stage) ? { closedOn: on } : {};
		if (dates.receivedOn && before.dueOn && dates.receivedOn > before.dueOn) {
			return refuse('invalid', 'It would come after the day it is due back. Move the due date first.', {
				fields: { on: ['This is after the day it is due back.'] }
			});
		}
		if (!(await loans.update(tx, id, input.version, { stage, ...dates }))) {
			return refuse(
				'conflict',
				'Somebody else moved this loan meanwhile. Look at where it stands now; nothing was changed.',
				{ detail: { version: before.version } }
			);
		}
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: `loan.${input.move}`,
				subjectKind: 'loan',
				subjectId: id,
				before: { stage: before.stage },
				after: { stage, on },
				reason: input.note || null
			}
		]);
		return done({ stage });
	});
}

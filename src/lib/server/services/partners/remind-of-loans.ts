import { DateTime } from 'luxon';
import { letter } from '../../../domain/mail/letter';
import { loanStageWords } from '../../../domain/stores/loan';
import { dueReminder, type DueReminder } from '../../../domain/stores/reminder';
import type { SystemContext } from '../../context';
import { inTransaction } from '../../db/client';
import * as loans from '../../db/queries/loan';
import * as recipients from '../../db/queries/handover';
import { publication } from '../../db/queries/settings';
import { post } from '../../jobs/outbox';

const when = ({ daysLeft }: DueReminder): string => {
	if (daysLeft === 0) return 'is due back today';
	const days = Math.abs(daysLeft) === 1 ? '1 day' : `${Math.abs(daysLeft)} days`;
	return daysLeft > 0 ? `is due back in ${days}` : `was due back ${days} ago`;
};

/**
 * Writes the reminders that loans call for today to every liaison: before the due date, on it, and each week after it.
 * Safe to run often: each reminder of a loan goes out once.
 * @returns how many loans were written about
 */
export async function remindOfLoans(ctx: SystemContext): Promise<number> {
	const { zone, name } = await publication(ctx.db);
	const horizon = DateTime.fromJSDate(ctx.now, { zone }).plus({ days: 14 }).toISODate() ?? '';
	const due = await loans.dueBy(ctx.db, horizon);
	const wanted = due.flatMap((loan) => {
		const reminder = loan.dueOn ? dueReminder(loan.dueOn, ctx.now, zone) : null;
		return loan.dueOn && reminder ? [{ loan, dueOn: loan.dueOn, reminder }] : [];
	});
	if (wanted.length === 0) return 0;

	return inTransaction(ctx.db, async (tx) => {
		const fresh = await loans.claimReminders(
			tx,
			wanted.map(({ loan, dueOn, reminder }) => ({
				loanId: loan.id,
				dueOn,
				kind: reminder.kind,
				sentAt: ctx.now
			}))
		);
		const claimed = wanted.filter(({ loan, reminder }) =>
			fresh.some((f) => f.loanId === loan.id && f.kind === reminder.kind)
		);
		const [liaisons, samples] = await Promise.all([
			recipients.withRole(tx, 'liaison'),
			loans.samplesOf(
				tx,
				claimed.map(({ loan }) => loan.id)
			)
		]);
		const mails = claimed.flatMap(({ loan, dueOn, reminder }) => {
			const things = samples
				.filter((s) => s.loanId === loan.id)
				.map((s) => `${s.maker} ${s.model}`)
				.join(', ');
			const day = DateTime.fromISO(dueOn, { zone }).toFormat('d LLLL yyyy');
			const content = letter({
				subject: `${things} ${when(reminder)}`,
				paragraphs: [
					`${things}, lent by ${loan.partnerName}, ${when(reminder)} (${day}). The loan is ${loanStageWords[loan.stage]}.`
				],
				link: { label: 'Open the loan', href: `${ctx.origin}/partners/loans/${loan.id}` },
				publication: name,
				because: 'You look after the loans.'
			});
			return liaisons.map((person) => ({
				...content,
				recipient: person.email,
				messageId: `loan-${loan.id}-${dueOn}-${reminder.kind}-${person.id}@calipress`
			}));
		});
		await post(tx, ctx.now, mails);
		return claimed.length;
	});
}

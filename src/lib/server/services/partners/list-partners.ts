import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { LoanStage } from '../../../domain/stores/words';
import type { Context } from '../../context';
import * as loans from '../../db/queries/loan';
import * as partners from '../../db/queries/partner';

const pageSize = 50;

/** Partners by name, a page at a time, with open and overdue loans. `zone` decides what day today is. */
export async function listPartners(
	ctx: Context,
	{ text, page, zone }: { text: string; page: number; zone: string }
) {
	if (!may(ctx.actor, 'partner.read')) return refuse('forbidden', 'Partners are the liaison’s.');
	const today = DateTime.fromJSDate(ctx.now, { zone }).toISODate() ?? '';
	const [rows, total] = await Promise.all([
		partners.list(ctx.db, { text, today, limit: pageSize, offset: (page - 1) * pageSize }),
		partners.countMatching(ctx.db, text)
	]);
	return done({ rows, total, pages: Math.max(1, Math.ceil(total / pageSize)), today });
}

/** Loans that are not closed, the soonest due first, with their samples. */
export async function listLoans(ctx: Context, stages: LoanStage[], partnerId?: number) {
	if (!may(ctx.actor, 'loan.read')) return refuse('forbidden', 'Loans are the liaison’s.');
	const rows = await loans.list(ctx.db, { stages, partnerId, limit: 200, offset: 0 });
	const samples = await loans.samplesOf(
		ctx.db,
		rows.map((row) => row.id)
	);
	return done(
		rows.map((row) => ({
			...row,
			samples: samples
				.filter((s) => s.loanId === row.id)
				.map((s) => ({ slug: s.slug, name: `${s.maker} ${s.model}` }))
		}))
	);
}

/** A partner with every loan it made. */
export async function readPartner(
	ctx: Context,
	slug: string
): Promise<
	Outcome<{ partner: NonNullable<Awaited<ReturnType<typeof partners.bySlug>>>; loans: ListedLoan[] }>
> {
	if (!may(ctx.actor, 'partner.read')) return refuse('forbidden', 'Partners are the liaison’s.');
	const partner = await partners.bySlug(ctx.db, slug);
	if (!partner) return refuse('not_found', 'There is no such partner.');
	const made = await listLoans(ctx, [], partner.id);
	return made.ok ? done({ partner, loans: made.value }) : made;
}

type Listed = Awaited<ReturnType<typeof listLoans>>;
export type ListedLoan = Extract<Listed, { ok: true }>['value'][number];

import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { LoanStage } from '../../../domain/stores/words';
import { paged, pageSize } from '../../../schemas/listing';
import type { Context } from '../../context';
import * as loans from '../../db/queries/loan';
import * as partners from '../../db/queries/partner';
import { publication } from '../../db/queries/settings';

const todayIn = (zone: string, now: Date): string => DateTime.fromJSDate(now, { zone }).toISODate() ?? '';

/** Partners by name, a page at a time, with open and overdue loans. */
export async function listPartners(ctx: Context, { q, page }: { q: string; page: number }) {
	if (!may(ctx.actor, 'partner.read')) return refuse('forbidden', 'Partners are the liaison’s.');
	const { zone } = await publication(ctx.db);
	const today = todayIn(zone, ctx.now);
	const [rows, total] = await Promise.all([
		partners.list(ctx.db, { text: q, today, limit: pageSize, offset: (page - 1) * pageSize }),
		partners.countMatching(ctx.db, q)
	]);
	return done({ ...paged(rows, total, page), today });
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
export async function readPartner(ctx: Context, slug: string) {
	if (!may(ctx.actor, 'partner.read')) return refuse('forbidden', 'Partners are the liaison’s.');
	const [partner, { zone }] = await Promise.all([partners.bySlug(ctx.db, slug), publication(ctx.db)]);
	if (!partner) return refuse('not_found', 'There is no such partner.');
	const made = await listLoans(ctx, [], partner.id);
	return made.ok ? done({ partner, loans: made.value, today: todayIn(zone, ctx.now) }) : made;
}

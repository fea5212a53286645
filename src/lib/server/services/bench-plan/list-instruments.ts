import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { InstrumentsQuery } from '../../../schemas/instrument';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { Context } from '../../context';
import * as instruments from '../../db/queries/instrument';
import * as settings from '../../db/queries/settings';

export interface InstrumentList extends Paged<
	Awaited<ReturnType<typeof instruments.list>>[number] & { uses: number }
> {
	/** ISO day in the publication's zone, by which a calibration is overdue. */
	today: string;
}

/** One page of the instruments with how many columns of campaigns name each. */
export async function listInstruments(
	ctx: Context,
	query: InstrumentsQuery
): Promise<Outcome<InstrumentList, 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rows, total, { zone }] = await Promise.all([
		instruments.list(ctx.db, { ...query, limit: pageSize, offset: (query.page - 1) * pageSize }),
		instruments.total(ctx.db, query),
		settings.publication(ctx.db)
	]);
	const ids = rows.map((row) => row.id);
	const uses = grouped(await instruments.usesOf(ctx.db, ids), (use) => use.instrumentId);
	const list = paged(
		rows.map((row) => ({ ...row, uses: uses.get(row.id)?.length ?? 0 })),
		total,
		query.page
	);
	return done({ ...list, today: DateTime.fromJSDate(ctx.now).setZone(zone).toISODate() ?? '' });
}

import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { InstrumentsApiQuery } from '../../../schemas/instrument';
import type { Context } from '../../context';
import * as instruments from '../../db/queries/instrument';
import { showInstrument, type InstrumentPage } from './show-instrument';

type Row = Awaited<ReturnType<typeof instruments.list>>[number];

const describeInstrument = ({ retiredAt, ...row }: Row) => ({ ...row, retired: retiredAt !== null });

export type InstrumentItem = ReturnType<typeof describeInstrument>;

/** Instruments in the order they were written down, one more than asked for where there are more. */
export async function listInstrumentsForApi(
	ctx: Context,
	query: InstrumentsApiQuery
): Promise<Outcome<InstrumentItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const window = { limit: query.limit + 1, offset: 0 };
	const rows = await instruments.list(ctx.db, { ...query, sort: 'id', way: 'up', ...window });
	return done(rows.map(describeInstrument));
}

const wholeInstrument = ({ instrument, uses }: InstrumentPage) => ({
	...describeInstrument(instrument),
	uses: uses.map(({ campaign, workload }) => ({ campaign, workload }))
});

/** An instrument by slug or id, with the columns of campaigns that name it. */
export async function instrumentForApi(
	ctx: Context,
	ref: string
): Promise<Outcome<ReturnType<typeof wholeInstrument>, 'forbidden' | 'not_found'>> {
	const shown = await showInstrument(ctx, ref);
	return shown.ok ? done(wholeInstrument(shown.value)) : shown;
}

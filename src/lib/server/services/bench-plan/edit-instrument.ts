import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { InstrumentEdit, InstrumentRetire } from '../../../schemas/instrument';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as instruments from '../../db/queries/instrument';

type Row = Awaited<ReturnType<typeof instruments.byRefs>>[number];
type Change = Partial<Omit<Row, 'id' | 'slug' | 'version' | 'createdAt'>>;

async function write(
	ctx: Context,
	ref: string,
	version: number,
	decide: (row: Row) => { act: string; change: Change }
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change instruments.');
	return inTransaction(ctx.db, async (tx) => {
		const [before] = await instruments.byRefs(tx, [ref]);
		if (!before) return refuse('not_found', `There is no instrument “${ref}” in the lab.`);
		const { act, change } = decide(before);
		if (!(await instruments.update(tx, before.id, version, change)))
			return changedMeanwhile('instrument', before.version);
		const was = Object.fromEntries(Object.keys(change).map((key) => [key, before[key as keyof Change]]));
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act,
				subjectKind: 'instrument',
				subjectId: before.id,
				before: was,
				after: change
			}
		]);
		return done({ slug: before.slug });
	});
}

/** Changes an instrument over the version that was seen, such as after a calibration. */
export const editInstrument = (ctx: Context, ref: string, { version, ...input }: InstrumentEdit) =>
	write(ctx, ref, version, () => ({
		act: 'instrument.edit',
		change: {
			...input,
			calibratedOn: input.calibratedOn || null,
			calibrationDueOn: input.calibrationDueOn || null
		}
	}));

/** Takes an instrument out of use, or back into it; campaigns that name it go on naming it. */
export const retireInstrument = (ctx: Context, ref: string, { version, retired }: InstrumentRetire) =>
	write(ctx, ref, version, ({ retiredAt }) => ({
		act: 'instrument.retire',
		change: { retiredAt: retired === 'yes' ? (retiredAt ?? ctx.now) : null }
	}));

import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CellSign, ChosenSign } from '../../../schemas/run';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as plans from '../../db/queries/campaign-plan';
import * as signatures from '../../db/queries/cell-signature';
import * as readings from '../../db/queries/reading';
import { findOpenCampaign } from './find-campaign';
import { cellName, findCell, findCells, type FoundCell } from './find-cell';

export interface MissingCell {
	profile: string;
	workload: string;
	taken: number;
	needed: number;
}

export interface Signed {
	/** profile/workload, by slug. */
	signed: string[];
	/** Cells that want readings before they can be signed. */
	missing: MissingCell[];
}

const key = (cell: { profileId: number; workloadId: number }) => `${cell.profileId}/${cell.workloadId}`;

const everyCell = (plan: CampaignPlan): FoundCell[] =>
	plan.profiles.flatMap((profile) => plan.workloads.map((workload) => ({ profile, workload })));

function wanted(plan: CampaignPlan, input: CellSign): Outcome<FoundCell[], 'invalid'> {
	if (input.profile === '' && input.workload === '') return done(everyCell(plan));
	const one = findCell(plan, input);
	return one.ok ? done([one.value]) : one;
}

/** What of some cells is complete and unsigned, and what is missing, while they are locked. */
async function sort(ctx: Context, campaignId: number, cells: FoundCell[]) {
	const counts = new Map(
		(await readings.countsOfCells(ctx.db, campaignId)).map((row) => [key(row), row.readings])
	);
	const signed = new Set((await signatures.standing(ctx.db, campaignId)).map(key));
	const ready: FoundCell[] = [];
	const missing: MissingCell[] = [];
	for (const cell of cells) {
		const id = key({ profileId: cell.profile.id, workloadId: cell.workload.id });
		const taken = counts.get(id) ?? 0;
		const { needed } = cell.workload;
		if (taken < needed)
			missing.push({ profile: cell.profile.slug, workload: cell.workload.slug, taken, needed });
		else if (!signed.has(id)) ready.push(cell);
	}
	return { ready, missing };
}

function nothingToSign(missing: MissingCell[], cells: number) {
	const [first] = missing;
	if (!first)
		return refuse(
			'conflict',
			cells === 1 ? 'This cell is signed already.' : 'Every one of these cells is signed already.'
		);
	const words =
		cells === 1
			? `This cell has ${first.taken} of ${first.needed} readings. Nothing was signed; take the other ${first.needed - first.taken} first.`
			: 'None of the unsigned cells is complete yet. Nothing was signed.';
	return refuse('invalid', words, { detail: { missing } });
}

async function sign(ctx: Context, plan: CampaignPlan, cells: FoundCell[]): Promise<Outcome<Signed>> {
	const campaignId = plan.head.id;
	const { ready, missing } = await sort(ctx, campaignId, cells);
	if (ready.length === 0) return nothingToSign(missing, cells.length);
	await signatures.insertMany(
		ctx.db,
		ready.map((cell) => ({
			campaignId,
			profileId: cell.profile.id,
			workloadId: cell.workload.id,
			signedBy: ctx.actor.id,
			signedAt: ctx.now
		}))
	);
	await audit.append(
		ctx.db,
		ready.map((cell) => ({
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'cell.sign',
			subjectKind: 'campaign',
			subjectId: campaignId,
			before: { cell: cellName(cell), signed: false },
			after: { cell: cellName(cell), signed: true }
		}))
	);
	return done({ signed: ready.map(cellName), missing });
}

async function signFound(
	ctx: Context,
	campaignRef: string,
	choose: (plan: CampaignPlan) => Outcome<FoundCell[], 'invalid'>
): Promise<Outcome<Signed>> {
	if (!may(ctx.actor, 'cell.sign')) return refuse('forbidden', 'Only a tester signs data off.');
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const plan = found.value;
	const cells = choose(plan);
	if (!cells.ok) return cells;
	return inTransaction(ctx.db, async (db) => {
		await plans.lockCells(
			db,
			plan.head.id,
			[...new Set(cells.value.map((cell) => cell.profile.id))],
			[...new Set(cells.value.map((cell) => cell.workload.id))]
		);
		return sign({ ...ctx, db }, plan, cells.value);
	});
}

/** Signs a cell off, or with none named every complete cell of the campaign; says which cells want readings. */
export const signCells = (ctx: Context, campaignRef: string, input: CellSign) =>
	signFound(ctx, campaignRef, (plan) => wanted(plan, input));

/** Signs the complete ones of chosen cells off; says which of them want readings. */
export const signChosenCells = (ctx: Context, campaignRef: string, input: ChosenSign) =>
	signFound(ctx, campaignRef, (plan) => findCells(plan, input.cell));

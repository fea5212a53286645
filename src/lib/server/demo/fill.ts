import { count } from 'drizzle-orm';
import { inTransaction, type Connection, type Transaction } from '../db/client';
import { setting, user } from '../db/schema';
import { env } from '../env';
import { perform, type World } from './act';
import { articlesInHand } from './articles/in-hand';
import { printedArticles } from './articles/printed';
import { calendarAround, demoZone } from './calendar';
import { campaigns } from './campaigns/all';
import { glossaryActs } from './glossary';
import { labActs } from './lab';
import { lenders } from './lenders';
import { settleJobs } from './settle-jobs';
import { parts } from './parts';
import { rigG2 } from './profiles/rig-g-2';
import { rigM4 } from './profiles/rig-m-4';
import { rigN12 } from './profiles/rig-n-12';
import { treeActs } from './profiles/tree';
import { rigActs } from './rigs';
import { samples } from './samples';
import { ladderActs } from './stability/ladder';
import { sweepActs } from './stability/sweep';
import { insertStaff } from './staff';
import { workloads } from './workloads';

const publication = {
	name: 'Northlight Hardware',
	zone: demoZone,
	tagline: 'Measured first, then printed.'
};

const story = (world: World) => [
	...parts(world),
	...samples(world),
	...lenders(world),
	...workloads(world),
	...labActs(world),
	...glossaryActs(world),
	...rigActs(world),
	...[rigN12, rigM4, rigG2].flatMap((tree) => treeActs(world, tree)),
	...sweepActs(world),
	...ladderActs(world),
	...campaigns(world),
	...printedArticles(world),
	...articlesInHand(world)
];

/** Fills within one transaction; false where another fill was there first. */
async function fill(tx: Transaction, now: Date, origin: string): Promise<boolean> {
	const calendar = calendarAround(now);
	const world: World = {
		calendar,
		runs: new Map(),
		loans: new Map(),
		comments: new Map(),
		attempts: new Map()
	};
	const staff = await insertStaff(tx, calendar.at(-70, '09:00'));
	if (!staff) return false;
	await tx.insert(setting).values({ key: 'publication', isDemo: true, value: publication });
	await perform(story(world), staff, { db: tx, origin });
	await settleJobs(tx, now);
	return true;
}

/**
 * Fills an empty database with the demo; one with people in it is left as it is. It is one transaction, so a fill
 * that is interrupted leaves nothing, and of two at once the later finds the people of the earlier.
 * @returns whether it was this call that filled it
 */
export async function fillDemo(
	db: Connection,
	now: Date,
	origin = env().ORIGIN.replace(/\/$/, '')
): Promise<boolean> {
	const [people] = await db.select({ n: count() }).from(user);
	if ((people?.n ?? 0) > 0) return false;
	return inTransaction(db, (tx) => fill(tx, now, origin));
}

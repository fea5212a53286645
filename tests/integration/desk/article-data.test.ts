import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import {
	embargo,
	loan,
	loanSample,
	partner,
	partPrice,
	reading,
	run,
	sample
} from '../../../src/lib/server/db/schema';
import { articleData } from '../../../src/lib/server/services/articles/article-data';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import type { People } from './desk-test';
import { measuredCampaign } from './measured-campaign';

let database: TestDatabase;
let who: People;
const now = new Date('2026-11-11T08:00:00.000Z');
const later = (days: number) => new Date(now.getTime() + days * 86_400_000);

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
});

const gather = (ids: number[]) => articleData({ db: database.db, now }, ids);

/** A loan of one sample, with what was agreed. */
async function lend(
	sampleId: number,
	stage: 'promised' | 'here' | 'returned',
	disclosure: string
): Promise<number> {
	const { db } = database;
	const [partnerRow] = await db
		.insert(partner)
		.values({ slug: `hollin-${stage}-${disclosure.length}`, name: 'Hollin', notes: '', createdAt: now })
		.$returningId();
	const [loanRow] = await db
		.insert(loan)
		.values({
			partnerId: partnerRow?.id ?? 0,
			stage,
			terms: '',
			disclosure,
			createdBy: who.liaison.id,
			createdAt: now
		})
		.$returningId();
	const loanId = loanRow?.id ?? 0;
	await db.insert(loanSample).values({ loanId, sampleId });
	return loanId;
}

describe('what an article may name', () => {
	it('is the campaign as it was measured, with what follows from it', async () => {
		const { campaignId } = await measuredCampaign(database.db, who.tester, { voltage: '1.24' });
		const { campaigns, zone } = await gather([campaignId]);
		expect(zone).toBe('UTC');
		const [campaign] = campaigns;
		expect(campaign?.baseline).toBe('stock');
		expect(campaign?.rig).toMatchObject({ name: 'N-12', revision: 1, firmware: '2.14' });
		const fixed = campaign?.cells.find((cell) => cell.profile === 'fixed-495');
		// Mean of 31.1, 31.3, 31.2, 31.2, 31.2 and the ratio of 35.1 to it, by hand.
		expect(fixed?.summary?.mean).toBeCloseTo(31.2, 12);
		expect(fixed?.comparison?.ratio).toBeCloseTo(1.125, 12);
		expect(fixed?.signedBy).toBe('Tomas Reyl');
		expect(fixed?.testers).toEqual(['Tomas Reyl']);
		const profile = campaign?.profiles.find((one) => one.slug === 'fixed-495');
		expect(profile?.parent).toBe('stock');
		expect(profile?.settings).toEqual([
			expect.objectContaining({
				setting: 'Core voltage',
				value: '1.24',
				stockValue: '1.17',
				parentValue: '1.17'
			})
		]);
	});

	it('leaves out excluded readings and voided runs', async () => {
		const { db } = database;
		const { campaignId, runs } = await measuredCampaign(db, who.tester);
		await db
			.update(run)
			.set({ voidedAt: now, voidedBy: who.tester.id, voidReason: 'the fan stood still' })
			.where(eq(run.id, runs.stock));
		const [one] = await db.select().from(reading).where(eq(reading.runId, runs['fixed-495'])).limit(1);
		await db
			.update(reading)
			.set({ excludedAt: now, excludedBy: who.tester.id, excludeReason: 'a door opened' })
			.where(eq(reading.id, one?.id ?? 0));
		const { campaigns } = await gather([campaignId]);
		const cell = (name: string) => campaigns[0]?.cells.find((figures) => figures.profile === name);
		expect(cell('stock')?.summary).toBeNull();
		expect(cell('fixed-495')?.summary?.n).toBe(4);
		expect(cell('fixed-495')?.comparison).toBeNull();
	});

	it('has the latest price of each part', async () => {
		const { db } = database;
		const { campaignId, sampleId } = await measuredCampaign(db, who.tester);
		const [row] = await db.select().from(sample).where(eq(sample.id, sampleId));
		await db.insert(partPrice).values(
			[
				{ amountMinor: 71900, observedOn: '2026-09-01' },
				{ amountMinor: 68900, observedOn: '2026-11-03' },
				{ amountMinor: 70900, observedOn: '2026-10-01' }
			].map((price) => ({ ...price, partId: row?.partId ?? 0, currency: 'USD', createdAt: now }))
		);
		const { campaigns } = await gather([campaignId]);
		expect(campaigns[0]?.kit).toEqual([
			expect.objectContaining({
				partName: 'Aldermoor 1650',
				provenance: 'bought',
				price: { amountMinor: 68900, currency: 'USD', observedOn: '2026-11-03' }
			})
		]);
	});

	it('carries what was agreed with the loan that brought a sample, and no loan that did not come', async () => {
		const { campaignId, sampleId } = await measuredCampaign(database.db, who.tester, {
			provenance: 'loaned'
		});
		await lend(sampleId, 'returned', 'Hollin lent it in spring.');
		await lend(sampleId, 'here', 'Hollin lends us the processor.');
		await lend(sampleId, 'promised', 'Hollin will lend it again.');
		const { duties } = await gather([campaignId]);
		expect(duties).toEqual([
			expect.objectContaining({
				provenance: 'loaned',
				disclosure: 'Hollin lends us the processor.',
				embargoes: []
			})
		]);
	});

	it('carries embargoes that stand, not those lifted or over', async () => {
		const { db } = database;
		const { campaignId, sampleId } = await measuredCampaign(db, who.tester, { provenance: 'pre-production' });
		await db.insert(embargo).values([
			{ sampleId, field: 'results', until: later(3), note: '', createdAt: now },
			{ sampleId, field: 'everything', until: later(-1), note: '', createdAt: now },
			{
				sampleId,
				field: 'specification',
				until: later(9),
				note: '',
				createdAt: now,
				liftedAt: now,
				liftedBy: who.liaison.id,
				liftReason: 'told early'
			}
		]);
		const { duties } = await gather([campaignId]);
		expect(duties[0]?.embargoes).toEqual([{ field: 'results', until: later(3).toISOString() }]);
	});

	it('keeps the order of the campaigns and asks no more for more of them', async () => {
		const { db, pool } = database;
		const one = await measuredCampaign(db, who.tester, { slug: 'one' });
		const two = await measuredCampaign(db, who.tester, { slug: 'two' });
		const asked = async (ids: number[]) => {
			let queries = 0;
			const count = () => (queries += 1);
			pool.on('acquire', count);
			const { campaigns } = await gather(ids);
			pool.off('acquire', count);
			return { queries, slugs: campaigns.map((campaign) => campaign.slug) };
		};
		const single = await asked([one.campaignId]);
		const both = await asked([two.campaignId, one.campaignId]);
		expect(both.slugs).toEqual(['two', 'one']);
		expect(both.queries).toBe(single.queries);
	});

	it('is empty for no campaign', async () => {
		expect(await gather([])).toMatchObject({
			campaigns: [],
			duties: [],
			ladders: [],
			sweeps: [],
			zone: 'UTC'
		});
	});
});

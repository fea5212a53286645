import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { preflight } from '../../../src/lib/domain/articles/preflight/all-checks';
import { renderArticle } from '../../../src/lib/domain/articles/render-article';
import { profileDifference } from '../../../src/lib/domain/bench/tuning/profile-difference';
import { profileReading } from '../../../src/lib/domain/bench/tuning/lab-reading';
import type { Actor } from '../../../src/lib/domain/people/roles';
import { meaningInput } from '../../../src/lib/schemas/firmware-meaning';
import { labLimitInput } from '../../../src/lib/schemas/lab-limit';
import type { Context } from '../../../src/lib/server/context';
import { openArticle } from '../../../src/lib/server/services/articles/open-article';
import { compareProfiles } from '../../../src/lib/server/services/bench-plan/compare-profiles';
import { createLabLimit } from '../../../src/lib/server/services/bench-plan/create-limit';
import { createMeaning } from '../../../src/lib/server/services/bench-plan/create-meaning';
import { offerProfile } from '../../../src/lib/server/services/bench-plan/offer-profile';
import { profileForApi } from '../../../src/lib/server/services/bench-plan/profile-for-api';
import { showProfile } from '../../../src/lib/server/services/bench-plan/show-profile';
import { showRig } from '../../../src/lib/server/services/bench-plan/show-rig';
import { ladderStart } from '../../../src/lib/server/services/stability/ladder-start';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { addProfile, addRig, addWorkload, measure, must } from '../bench-plan/plan';
import { slug as article, writtenArticle } from '../desk/desk-test';

let database: TestDatabase;
let staff: Record<'tester' | 'writer', Actor>;
let ctx: Context;
let campaign: string;

const row = (setting: string, value: string, unit = '') => ({
	menuPath: 'Tweaker',
	setting,
	value,
	unit
});

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	staff = await people(database.db);
	ctx = contextFor(database.db, staff.tester);
	await addRig(ctx, { firmwareFamily: 'Hollin' });
	await addWorkload(ctx);
	// No row says itself what it sets: all of it comes from the lab's list, but for the last.
	await addProfile(ctx, {
		name: 'Limits up',
		settings: [
			row('Base tick', '100', 'MHz'),
			row('All-core multiple', '49.5', '×'),
			row('Vcore', '1.40', 'V'),
			row('Halo', 'Level 2')
		]
	});
	({ slug: campaign } = await measure(ctx, 'limits-up'));
});

/** Says what three of the settings set, and how far the lab goes with one of them. */
async function teach() {
	const told = [
		['Base tick', 'reference-clock'],
		['All-core multiple', 'core-ratio'],
		['Vcore', 'core-voltage']
	];
	for (const [setting, quantity] of told)
		await must(createMeaning(ctx, meaningInput.parse({ family: 'Hollin', setting, quantity })));
	const limit = { quantity: 'core-voltage', partKind: 'processor', limit: '1.35', unit: 'V' };
	await must(createLabLimit(ctx, labLimitInput.parse({ ...limit, source: 'What we have seen' })));
}

const shownOnPage = async () => {
	const { lineage, lab } = await must(showProfile(ctx, 'n-12', 'limits-up'));
	return profileReading(lineage, lab);
};
const preview = async () => {
	const opened = await openArticle(contextFor(database.db, staff.writer), article);
	if (!opened.ok) throw new Error(opened.message);
	return opened.value;
};

describe('a profile whose settings only the lab’s meanings explain', () => {
	it('says the same on its page, beside another, in its form, in an article and to a script', async () => {
		await teach();
		await writtenArticle(database.db, staff.writer, {
			campaign,
			source: `::steps{campaign=${campaign} profile=limits-up}`
		});
		const page = await shownOnPage();
		// 100 MHz × 49.5, by hand.
		expect(page.derived).toMatchObject([{ name: 'Core clock', value: 4950, unit: 'MHz' }]);
		expect(page.advice).toMatchObject([
			{ kind: 'over-the-lab-limit', severity: 'warning', settings: ['Vcore'] }
		]);

		const api = await must(profileForApi(ctx, 'limits-up', 'n-12'));
		const inArticle = (await preview()).data.campaigns[0]?.profiles.find((one) => one.slug === 'limits-up');
		const { a, b, lab } = await must(compareProfiles(ctx, 'n-12', 'stock', 'limits-up'));
		const beside = profileReading(b?.lineage ?? [], lab);
		const offer = await must(offerProfile(ctx, 'n-12'));
		const stock = offer.profiles.find((one) => one.slug === 'stock');
		const own = offer.profiles.find((one) => one.slug === 'limits-up');
		const inForm = profileReading(stock && own ? [stock, own] : [], offer.lab);
		for (const other of [
			{ settings: api.effective, derived: api.derived, advice: api.advice },
			{ settings: inArticle?.settings, derived: inArticle?.derived, advice: inArticle?.advice },
			beside,
			inForm
		])
			expect(other).toEqual(page);
		const difference = profileDifference(profileReading(a?.lineage ?? [], lab).settings, beside.settings);
		expect(difference.derived).toMatchObject([{ name: 'Core clock', a: null, b: { value: 4950 } }]);
	});

	it('has its cautions and the lab’s limit in the article too, as preview and as what preflight finds', async () => {
		const source = `::steps{campaign=${campaign} profile=limits-up}`;
		await writtenArticle(database.db, staff.writer, { campaign, source });
		expect((await preview()).html).not.toContain('Caution:');
		await teach();
		const { html, data } = await preview();
		expect(html).toContain('Caution:');
		const findings = preflight({
			title: 'Limits',
			standfirst: '',
			source,
			page: renderArticle(source, data, () => ''),
			data,
			blockingComments: [],
			printAt: null,
			now: ctx.now
		});
		expect(findings.filter((one) => one.check === 'lab-limits')).toMatchObject([
			{ severity: 'advice', message: expect.stringContaining('lab’s own limit of 1.35 V') }
		]);
	});

	it('lets a ladder begin at the clock and voltage that the meanings tell', async () => {
		const { profile } = await must(showProfile(ctx, 'n-12', 'limits-up'));
		const at = { rigId: profile.rigId, profileId: profile.id };
		expect(await ladderStart(database.db, at)).toBeNull();
		await teach();
		expect(await ladderStart(database.db, at)).toEqual({ clockMHz: 4950, volts: 1.4 });
	});

	it('is asked about on its rig, by the names that nothing explains yet', async () => {
		const asked = async () => (await must(showRig(ctx, 'n-12'))).unexplained;
		expect(await asked()).toEqual(['Base tick', 'All-core multiple', 'Vcore', 'Halo']);
		await teach();
		expect(await asked()).toEqual(['Halo']);
	});
});

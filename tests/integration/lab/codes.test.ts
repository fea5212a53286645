import { isRedirect } from '@sveltejs/kit';
import jsQR from 'jsqr';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { Context } from '../../../src/lib/server/context';
import { drawLabels } from '../../../src/lib/server/services/stores/draw-labels';
import { findSample } from '../../../src/lib/server/services/stores/find-sample';
import { load } from '../../../src/routes/(staff)/stores/scan/+page.server';
import { useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent } from '../../support/event';
import { people } from '../../support/people';
import { addPart, addSample, must } from '../bench-plan/plan';

let database: TestDatabase;
let tester: Actor;
let ctx: Context;

beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
	tester = (await people(database.db)).tester;
	ctx = contextFor(database.db, tester);
	await addPart(ctx);
	await addSample(ctx, { slug: 'n-101', serial: 'AM16-004417' });
	await addSample(ctx, { slug: 'n-102', serial: 'AM16 5' });
	await addSample(ctx, { slug: 'n-103', serial: 'am165' });
});
afterAll(() => database.close());

/** Paints a label's path as a picture of four points to a module, as a camera would see it. */
function pictureOf({ side, path }: { side: number; path: string }) {
	const scale = 4;
	const width = side * scale;
	const data = new Uint8ClampedArray(width * width * 4).fill(255);
	for (const [, x, y, run] of path.matchAll(/M(\d+) (\d+)h(\d+)/g))
		for (let row = 0; row < scale; row += 1)
			for (let column = 0; column < Number(run) * scale; column += 1) {
				const at = ((Number(y) * scale + row) * width + Number(x) * scale + column) * 4;
				data.fill(0, at, at + 3);
			}
	return { data, width };
}

describe('a label', () => {
	// jsQR is another program than the one that draws.
	it('bears a code that another reader reads as the sample’s address', async () => {
		const { labels, missing } = await must(drawLabels(ctx, ['n-102', 'no-such', 'n-101', 'n-101']));
		expect(labels.map((label) => label.slug)).toEqual(['n-102', 'n-101']);
		expect(missing).toEqual(['no-such']);
		for (const { qr, slug } of labels) {
			const { data, width } = pictureOf(qr);
			expect(jsQR(data, width, width)?.data).toBe(`https://northlight.example/stores/samples/${slug}`);
		}
	});
});

describe('a code', () => {
	it.each([
		['n-101', 'n-101'],
		['N-101', 'n-101'],
		['am16-004417', 'n-101'],
		['https://northlight.example/stores/samples/n-102', 'n-102']
	])('%s names %s', async (typed, slug) => {
		expect((await must(findSample(ctx, typed))).exact?.slug).toBe(slug);
	});

	it('that two serial numbers share names neither, and shows both', async () => {
		const { exact, near } = await must(findSample(ctx, 'AM165'));
		expect(exact).toBeNull();
		expect(near.map((row) => row.slug)).toEqual(['n-102', 'n-103']);
	});

	it('that is part of one shows what it may mean; one that is nowhere shows nothing', async () => {
		expect((await must(findSample(ctx, '0044'))).near.map((row) => row.slug)).toEqual(['n-101']);
		expect(await must(findSample(ctx, '%'))).toMatchObject({ exact: null, near: [] });
		expect(await must(findSample(ctx, ''))).toMatchObject({ exact: null, near: [] });
	});

	it('opens the sample without scripts', async () => {
		const opened = Promise.resolve(
			load(fakeEvent({ path: '/stores/scan?code=n-101', actor: tester }) as never)
		);
		const thrown: unknown = await opened.catch((error: unknown) => error);
		expect(isRedirect(thrown) && thrown.location).toBe('/stores/samples/n-101');
	});
});

import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { GET as plateFile } from '../../../src/routes/(staff)/desk/articles/[slug]/plates/[file]/+server';
import { GET as scriptFile } from '../../../src/routes/(staff)/desk/articles/[slug]/narration/[file]/+server';
import { readNarration } from '../../../src/lib/server/services/articles/read-narration';
import { useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent } from '../../support/event';
import { people } from '../../support/people';
import { slug, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign } from './measured-campaign';

let database: TestDatabase;
let who: People;
beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
	who = await people(database.db);
	await measuredCampaign(database.db, who.tester);
	await writtenArticle(database.db, who.writer);
});
afterAll(() => database.close());

const ask = (handler: (event: never) => Promise<Response>, file: string, query = '') =>
	handler(
		fakeEvent({
			path: `/desk/articles/${slug}/x/${file}${query}`,
			params: { slug, file },
			actor: who.writer
		}) as never
	);

describe('the script of an article', () => {
	it('says what the bench holds, and is not for the liaison', async () => {
		const { script } = wanted(await readNarration(contextFor(database.db, who.writer), slug));
		expect(script.gaps).toEqual([]);
		expect(script.sections[0]?.lines[0]?.text).toBe('Brisk against Pennon.');
		expect(await readNarration(contextFor(database.db, who.liaison), slug)).toMatchObject({
			reason: 'forbidden'
		});
	});

	it('comes as text and as SubRip at the pace asked for, and as nothing else', async () => {
		const text = await ask(scriptFile, 'script.txt', '?pace=100');
		expect(text.headers.get('content-disposition')).toContain('brisk-against-pennon-script.txt');
		expect(await text.text()).toContain('at 100 words a minute');
		expect(await (await ask(scriptFile, 'script.srt', '?pace=nonsense')).text()).toMatch(
			/^1\r\n00:00:00,000 --> 00:00:0\d,\d{3}\r\nBrisk against Pennon\.\r\n/
		);
		await expect(ask(scriptFile, 'script.doc')).rejects.toMatchObject({ status: 404 });
	});
});

describe('a plate for the screen', () => {
	it('is set 16 : 9 in its size and look, and carries its type', async () => {
		const { plates } = wanted(await readNarration(contextFor(database.db, who.writer), slug));
		const [plate] = plates;
		if (!plate) throw new Error('The text has no plate.');
		const dark = await (await ask(plateFile, `${plate.key}.2160p.dark.svg`)).text();
		expect(dark).toContain('width="3840" height="2160" viewBox="0 0 1920 1080"');
		expect(dark).toContain('--color-sheet:#1b2127');
		expect(dark).toMatch(/url\(["']?data:font\/woff2;base64,/);
		expect(dark).not.toMatch(/https?:\/\/(?!www\.w3\.org)/);
		for (const file of [`${plate.key}.720p.dark.svg`, `${plate.key}.1080p.dark.csv`, '../x.svg'])
			await expect(ask(plateFile, file)).rejects.toMatchObject({ status: 404 });
	});
});

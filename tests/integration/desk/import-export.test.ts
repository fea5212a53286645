import { strToU8, unzipSync, zipSync, type Zippable } from 'fflate';
import { count } from 'drizzle-orm';
import sharp from 'sharp';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { auditEvent, picture, revision } from '../../../src/lib/server/db/schema';
import { exportArticle } from '../../../src/lib/server/services/articles/export-article';
import { importArticle, importRevision } from '../../../src/lib/server/services/articles/import-article';
import { nameRevision } from '../../../src/lib/server/services/articles/name-revision';
import { openArticle } from '../../../src/lib/server/services/articles/open-article';
import { saveRevision } from '../../../src/lib/server/services/articles/save-revision';
import { storePicture } from '../../../src/lib/server/services/articles/store-picture';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { useFiles } from '../../support/files';
import { people } from '../../support/people';
import { slug, title, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign } from './measured-campaign';

let database: TestDatabase;
let who: People;
let forgetFiles: () => void;
const as = (role: keyof People) => contextFor(database.db, who[role]);
const campaign = 'aldermoor-1650-first-look';
const drawn = (background: string, width = 700) =>
	sharp({ create: { width, height: 400, channels: 3, background } });

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	forgetFiles?.();
	forgetFiles = useFiles();
	await emptyTables(database);
	who = await people(database.db);
	await measuredCampaign(database.db, who.tester);
});
afterAll(() => forgetFiles());

async function zipOf(name: string): Promise<Uint8Array> {
	const { content } = wanted(await exportArticle(as('writer'), name));
	const pieces: Uint8Array[] = [];
	for await (const piece of content) pieces.push(piece);
	return Buffer.concat(pieces);
}
const sent = (
	bytes: Uint8Array,
	more: { title?: string; campaigns?: string[]; keepMissing?: boolean } = {}
) => ({
	...{ bytes, fileName: 'article.zip', title: '', campaigns: [], keepMissing: false },
	...more
});
const file = (head: string, text: string, more: Zippable = {}) =>
	zipSync({ 'post/index.md': strToU8(`---\n${head}\n---\n\n${text}\n`), ...more });
const rows = async () => ({
	pictures: (await database.db.select({ n: count() }).from(picture))[0]?.n,
	revisions: (await database.db.select({ n: count() }).from(revision))[0]?.n,
	log: (await database.db.select({ n: count() }).from(auditEvent))[0]?.n
});

/** An article with two pictures in it, one of them twice. */
async function illustrated(): Promise<string> {
	await writtenArticle(database.db, who.writer);
	const put = async (bytes: Uint8Array) =>
		wanted(await storePicture(as('writer'), { bytes, alt: '', credit: '', fileName: 'x' })).address;
	const photo = await put(await drawn('#8f1d3f').jpeg().toBuffer());
	const screen = await put(await drawn('#1d8f3f', 300).png().toBuffer());
	const source = `First.\n\n![The cooler](${photo} "From above")\n\n![A screen](${screen})\n\n\`${photo}\`\n\nNo end`;
	wanted(await saveRevision(as('writer'), slug, { title, standfirst: 'A: "b" # c', source, basedOn: 2 }));
	wanted(await nameRevision(as('writer'), slug, { number: 3, label: 'as sent' }));
	return source;
}

describe('an exported article', () => {
	it('has its text with a head, its pictures, and a list of checksums', async () => {
		await illustrated();
		const files = unzipSync(await zipOf(slug));
		const text = Buffer.from(files['article.md'] ?? '').toString();
		expect(text).toContain(`title: ${title}`);
		expect(text).toContain('name: as sent');
		expect(text).toContain(`- ${campaign}`);
		expect(text).toMatch(/!\[The cooler\]\(pictures\/[0-9a-f]{64}\.webp "From above"\)/);
		expect(Object.keys(files).filter((name) => name.startsWith('pictures/'))).toHaveLength(2);
		expect(
			Buffer.from(files['checksums.sha256'] ?? '')
				.toString()
				.trim()
				.split('\n')
		).toHaveLength(3);
	});

	it('imports back over the same article without a change', async () => {
		await illustrated();
		const zip = await zipOf(slug);
		const before = await rows();
		const saved = wanted(await importRevision(as('writer'), slug, { ...sent(zip), basedOn: 3 }));
		expect(saved).toEqual({ revision: 3, changed: false, notes: [] });
		expect(await rows()).toEqual(before);
	});

	it('imports back on another installation: source equal to the letter, pictures equal by hash', async () => {
		const source = await illustrated();
		const hashes = (await database.db.select().from(picture)).map((one) => one.sha256).sort();
		const zip = await zipOf(slug);
		// Another database and another file store.
		await emptyTables(database);
		forgetFiles();
		forgetFiles = useFiles();
		who = await people(database.db);
		await measuredCampaign(database.db, who.tester);
		const made = wanted(await importArticle(as('writer'), sent(zip)));
		expect(made).toEqual({ slug, notes: [] });
		const opened = wanted(await openArticle(as('writer'), slug));
		expect(opened.head).toMatchObject({ title, standfirst: 'A: "b" # c', source });
		expect(opened.article.template).toBe('short-note');
		expect(opened.campaigns.map((one) => one.slug)).toEqual([campaign]);
		expect((await database.db.select().from(picture)).map((one) => one.sha256).sort()).toEqual(hashes);
	});
});

describe('a file from elsewhere', () => {
	it('becomes an article, its pictures stored, their paths put for their addresses', async () => {
		const photo = await drawn('#334455').jpeg().toBuffer();
		const zip = file(
			`title: From elsewhere\ncampaigns: [${campaign}]\ntags: [fans]\nlayout: post`,
			'![A fan](../img/my%20fan.jpg "Loud")',
			{ 'img/my fan.jpg': new Uint8Array(photo) }
		);
		const made = wanted(await importArticle(as('writer'), sent(zip)));
		expect(made.notes.join(' ')).toMatch(/layout.*fans/);
		const [stored] = await database.db.select().from(picture);
		expect(stored).toMatchObject({ alt: 'A fan', fileName: 'my fan.jpg' });
		const opened = wanted(await openArticle(as('writer'), made.slug));
		expect(opened.head.source).toBe(
			`![A fan](/pictures/${stored?.sha256} "Loud")\n`.replace(' "', '.webp "')
		);
		expect(opened.html).toContain('<figcaption>Loud</figcaption>');
	});

	it('is refused with the names of what is missing, and then nothing has changed', async () => {
		const before = await rows();
		const head = `title: Lacks pictures\ncampaigns: [${campaign}]`;
		const zip = file(head, '![A](a.jpg)\n\n![B](b.png)', {
			'post/a.jpg': new Uint8Array(await drawn('#111').jpeg().toBuffer())
		});
		expect(await importArticle(as('writer'), sent(zip))).toMatchObject({
			ok: false,
			message: 'These pictures are named and are not in the file: b.png. Nothing was changed.'
		});
		expect(await rows()).toEqual(before);
		const made = wanted(await importArticle(as('writer'), sent(zip, { keepMissing: true })));
		expect(made.notes).toEqual(['Pictures still to be put in: b.png.']);
		const opened = wanted(await openArticle(as('writer'), made.slug));
		expect(opened.head.source).toContain('![B](b.png)');
	});

	it('whose campaign does not exist is refused with the nearest, until others are chosen', async () => {
		const zip = file('title: Another look\ncampaigns: aldermoor-1650-first-lok', 'Text.');
		expect(await importArticle(as('writer'), sent(zip))).toMatchObject({
			ok: false,
			fields: {
				campaigns: [
					`There is no campaign “aldermoor-1650-first-lok”. Near: ${campaign}. Choose those it is to use.`
				]
			}
		});
		wanted(await importArticle(as('writer'), sent(zip, { campaigns: [campaign] })));
	});

	it.each([
		[
			'a picture that is none',
			'title: Bad picture',
			'![A](a.jpg)',
			{ 'post/a.jpg': strToU8('<svg onload="1"/>') },
			'“a.jpg”: This is no picture'
		],
		['an unknown template', 'title: Bad kind\ntemplate: short-notes', 'Text.', {}, 'Near: short-note'],
		['no title', 'standfirst: x', 'Text.', {}, 'has no title'],
		['a head that cannot be read', 'title: "open', 'Text.', {}, 'on line'],
		['20,000 nested quotes', 'title: Deep quotes', '>'.repeat(20_000), {}, 'nested deeper'],
		['a text that is too long', 'title: Long text', 'word '.repeat(90_000), {}, '400000']
	])('with %s is refused, and then nothing has changed', async (_, head, text, more, words) => {
		const before = await rows();
		const outcome = await importArticle(
			as('writer'),
			sent(file(`${head}\ncampaigns: [${campaign}]`, text, more))
		);
		expect(outcome.ok ? 'taken' : outcome.message).toContain(words);
		expect(await rows()).toEqual(before);
	});

	it('over a revision that is not the newest any more is refused as a conflict, its pictures not entered', async () => {
		await writtenArticle(database.db, who.writer);
		const zip = file('title: Brisk against Pennon', '![A](a.jpg)', {
			'post/a.jpg': new Uint8Array(await drawn('#123').jpeg().toBuffer())
		});
		const before = await rows();
		expect(await importRevision(as('editor'), slug, { ...sent(zip), basedOn: 1 })).toMatchObject({
			ok: false,
			reason: 'conflict'
		});
		expect(await rows()).toEqual(before);
	});

	it('is for writers and editors; over an article for its author and the editors', async () => {
		await writtenArticle(database.db, who.writer);
		const zip = file('title: Not mine', 'Text.');
		for (const role of ['tester', 'liaison', 'admin'] as const) {
			expect(await importArticle(as(role), sent(zip))).toMatchObject({ ok: false, reason: 'forbidden' });
			expect(await importRevision(as(role), slug, { ...sent(zip), basedOn: 2 })).toMatchObject({
				ok: false,
				reason: 'forbidden'
			});
		}
		expect(await exportArticle(as('liaison'), slug)).toMatchObject({ ok: false, reason: 'forbidden' });
	});
});

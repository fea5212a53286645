import sharp from 'sharp';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { edition, picture } from '../../../src/lib/server/db/schema';
import { approveArticle } from '../../../src/lib/server/services/articles/approve-article';
import { publishArticle } from '../../../src/lib/server/services/articles/publish-article';
import { saveRevision } from '../../../src/lib/server/services/articles/save-revision';
import { submitArticle } from '../../../src/lib/server/services/articles/submit-article';
import { withdrawArticle } from '../../../src/lib/server/services/articles/withdraw-article';
import { GET } from '../../../src/routes/pictures/[file]/+server';
import { POST } from '../../../src/routes/api/v1/pictures/+server';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { StoredPicture } from '../../../src/lib/server/services/articles/take-in-picture';
import { origin, useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent } from '../../support/event';
import { useFiles } from '../../support/files';
import { people } from '../../support/people';
import { slug, title, versionOf, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign, sourceOf } from './measured-campaign';

let database: TestDatabase;
let who: People;
let forgetFiles: () => void;
const as = (role: keyof People) => contextFor(database.db, who[role]);
const jpeg = (background: string) =>
	sharp({ create: { width: 900, height: 600, channels: 3, background } })
		.jpeg()
		.toBuffer();

beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
	forgetFiles = useFiles();
});
afterAll(async () => {
	forgetFiles();
	await database.close();
});
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
});

async function send(actor: Actor | null, bytes: Uint8Array, query = ''): Promise<Response> {
	const event = fakeEvent({ path: `/api/v1/pictures${query}`, method: 'POST', actor });
	Object.assign(event, {
		request: new Request(`${origin}/api/v1/pictures`, { method: 'POST', body: Buffer.from(bytes) })
	});
	return (await POST(event as never)) as Response;
}
const sent = async (actor: Actor, bytes: Uint8Array, query = '') => {
	const response = await send(actor, bytes, query);
	expect(response.status, await response.clone().text()).toBe(201);
	return (await response.json()) as StoredPicture;
};
async function asked(file: string, actor: Actor | null, headers: Record<string, string> = {}) {
	const [path = '', query] = file.split('?');
	try {
		return (await GET(
			fakeEvent({ path: `/pictures/${path}?${query ?? ''}`, params: { file: path }, actor, headers }) as never
		)) as Response;
	} catch (thrown) {
		return new Response(null, { status: (thrown as { status: number }).status });
	}
}

describe('putting a picture in', () => {
	it('stores it once, whoever sends it again, and at the same moment', async () => {
		const bytes = await jpeg('#1d3f8f');
		const all = await Promise.all(
			[who.writer, who.editor, who.tester, who.writer].map((actor) => sent(actor, bytes, '?alt=Blue'))
		);
		expect(new Set(all.map((one) => one.sha256)).size).toBe(1);
		expect(all.filter((one) => !one.known)).toHaveLength(1);
		expect(await database.db.select().from(picture)).toEqual([
			expect.objectContaining({ width: 900, height: 600, alt: 'Blue', mime: 'image/webp' })
		]);
	});

	it('is for testers, writers and editors, and for tokens with the scope', async () => {
		const bytes = await jpeg('#123456');
		expect((await send(null, bytes)).status).toBe(401);
		expect((await send(who.liaison, bytes)).status).toBe(403);
		expect((await send({ ...who.writer, scopes: ['bench:read'] }, bytes)).status).toBe(403);
		expect((await send({ ...who.writer, scopes: ['pictures:write'] }, bytes)).status).toBe(201);
	});

	it('takes no more than 25 MB, and nothing that is no picture, and then stores nothing', async () => {
		const large = await send(who.writer, Buffer.alloc(25_000_001));
		expect([large.status, ((await large.json()) as { detail: string }).detail]).toEqual([
			413,
			expect.stringContaining('larger than 25 MB')
		]);
		const script = await send(who.writer, Buffer.from('<html><script>1</script>'), '?name=cooler.jpg');
		expect([script.status, await script.text()]).toEqual([
			422,
			expect.stringContaining('whatever its name says')
		]);
		expect(await database.db.select().from(picture)).toEqual([]);
	});
});

describe('a picture that readers ask for', () => {
	let put: StoredPicture;
	beforeEach(async () => {
		put = await sent(who.writer, await jpeg('#8f1d3f'));
		await measuredCampaign(database.db, who.tester);
		await writtenArticle(database.db, who.writer);
		const source = `${sourceOf('aldermoor-1650-first-look')}\n\n![The cooler](${put.address} "Seen from above")\n`;
		wanted(await saveRevision(as('writer'), slug, { title, standfirst: 'A cooler.', source, basedOn: 2 }));
	});
	const publish = async () => {
		const version = () => versionOf(database.db, slug);
		wanted(await submitArticle(as('writer'), slug, { version: await version() }));
		wanted(await approveArticle(as('editor'), slug, { version: await version() }));
		wanted(await publishArticle(as('editor'), slug, { version: await version() }));
	};
	const file = () => `${put.sha256}.webp`;

	it('is there for the desk while it is in a draft, and for nobody else, as if there were none', async () => {
		for (const actor of [null, who.liaison]) expect((await asked(file(), actor)).status).toBe(404);
		const forDesk = await asked(file(), who.writer);
		expect([forDesk.status, forDesk.headers.get('cache-control')]).toEqual([200, 'private, no-cache']);
		expect((await asked(`${'0'.repeat(64)}.webp`, who.writer)).status).toBe(404);
		expect((await asked(`${put.sha256}.svg`, who.writer)).status).toBe(404);
		expect((await asked('..%2f..%2fsecret', who.writer)).status).toBe(404);
	});

	it('is there for everybody once it is printed, in the width asked for, and is kept for ever', async () => {
		await publish();
		const whole = await asked(file(), null);
		expect(whole.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
		expect(whole.headers.get('content-type')).toBe('image/webp');
		const bytes = Buffer.from(await whole.arrayBuffer());
		expect([bytes.byteLength, (await sharp(bytes).metadata()).width]).toEqual([put.bytes, 900]);
		const narrow = await asked(`${file()}?w=320`, null);
		expect((await sharp(Buffer.from(await narrow.arrayBuffer())).metadata()).width).toBe(640);
		const other = await asked(`${put.sha256}.jpg`, null);
		expect(other.headers.get('content-type')).toBe('image/jpeg');
		await other.arrayBuffer();
		const etag = whole.headers.get('etag') ?? '';
		expect(etag).not.toBe(narrow.headers.get('etag'));
		expect((await asked(file(), null, { 'if-none-match': etag })).status).toBe(304);
	});

	it('is gone for readers when the article is withdrawn', async () => {
		await publish();
		wanted(
			await withdrawArticle(as('editor'), slug, {
				version: await versionOf(database.db, slug),
				reason: 'The sample was not ours.'
			})
		);
		expect((await asked(file(), null)).status).toBe(404);
	});

	it('stands on the frozen page with its size, and in the data the edition was made from', async () => {
		await publish();
		const [frozen] = await database.db.select().from(edition);
		expect(frozen?.page).toContain('width="900" height="600"');
		expect(frozen?.page).toContain('<figcaption>Seen from above</figcaption>');
		expect(frozen?.data).toContain(put.sha256);
	});

	it('holds the approval back when it is not in the store', async () => {
		const source = `${sourceOf('aldermoor-1650-first-look')}\n\n![Nothing](/pictures/${'0'.repeat(64)}.webp)\n`;
		wanted(await saveRevision(as('writer'), slug, { title, standfirst: 'A cooler.', source, basedOn: 3 }));
		wanted(await submitArticle(as('writer'), slug, { version: await versionOf(database.db, slug) }));
		expect(
			await approveArticle(as('editor'), slug, { version: await versionOf(database.db, slug) })
		).toMatchObject({
			ok: false,
			message: expect.stringContaining('not in the store') as string
		});
	});
});

import { strToU8, zipSync, type Zippable } from 'fflate';
import { describe, expect, it } from 'vitest';
import { readArticleFile, writeArticleFile } from './front-matter';
import { readArticleUpload } from './read-article-zip';
import { isZip, readZip, zipLimits } from './read-zip';
import { writeZip } from './write-zip';
import { writeChecksums, sha256Of } from './checksums';

const md = strToU8('---\ntitle: Brisk\n---\n\nText.\n');
const zip = (files: Zippable) => zipSync(files, { level: 6 });
const refusal = (bytes: Uint8Array, name = 'article.zip') => {
	const read = readArticleUpload(bytes, name);
	return read.ok ? 'taken' : read.message;
};

describe('a zip', () => {
	it('is written in pieces and read back to the byte', async () => {
		const picture = new Uint8Array(200_000).map((_, index) => (index * 7919) % 251);
		const pieces = async function* () {
			yield await Promise.resolve(picture.subarray(0, 70_000));
			yield picture.subarray(70_000);
		};
		const text = async function* () {
			yield await Promise.resolve(md);
		};
		const out: Uint8Array[] = [];
		for await (const piece of writeZip(
			[
				{ name: 'article.md', packs: true, content: text },
				{ name: 'pictures/a.webp', packs: false, content: pieces }
			],
			new Date('2026-11-11T08:00:00Z')
		))
			out.push(piece);
		const whole = Buffer.concat(out);
		expect(isZip(whole)).toBe(true);
		const read = readZip(whole);
		if (!read.ok) throw new Error(read.message);
		expect([...read.value.keys()]).toEqual(['article.md', 'pictures/a.webp']);
		expect(Buffer.compare(read.value.get('pictures/a.webp') ?? new Uint8Array(), picture)).toBe(0);
	});

	it.each([
		['leads out of it', { '../evil.md': md }, 'leads out of it: “../evil.md”'],
		['leads out from within', { 'a/../../evil.md': md }, 'leads out of it'],
		['names a place', { '/etc/evil.md': md }, 'names a place on a disk'],
		['names a drive', { 'C:evil.md': md }, 'names a place on a disk'],
		['has a backslash', { '..\\evil.md': md }, 'a name that cannot be used']
	])('with an entry that %s is refused', (_, files, words) => {
		expect(refusal(zip(files as Zippable))).toContain(words);
	});

	it('with a link in the place of a file is refused', () => {
		// Mode 0120777 of a Unix file is a symbolic link.
		const linked = zip({
			'article.md': md,
			'pictures/a.jpg': [strToU8('/etc/passwd'), { os: 3, attrs: 0o120777 << 16 }]
		});
		expect(refusal(linked)).toContain('a link in the place of a file: “pictures/a.jpg”');
	});

	it('that unpacks to far more than it is, is refused by its list', () => {
		const bomb = zip({ 'article.md': md, 'pictures/a.png': new Uint8Array(20_000_000) });
		expect(bomb.byteLength).toBeLessThan(100_000);
		expect(refusal(bomb)).toContain('more than 200 times its size');
	});

	it('that lies in its list about what it unpacks to is refused while it unpacks', () => {
		const bomb = zip({ 'a.bin': new Uint8Array(4_000_000) });
		const view = new DataView(bomb.buffer, bomb.byteOffset, bomb.byteLength);
		// The size in the list at the end, and in the head of the entry.
		for (let at = 0; at < bomb.byteLength - 4; at++) {
			if (view.getUint32(at, true) === 0x02014b50) view.setUint32(at + 24, 10, true);
			if (view.getUint32(at, true) === 0x04034b50) view.setUint32(at + 22, 10, true);
		}
		const read = readZip(bomb, { ...zipLimits, entryBytes: 1_000_000 });
		expect(read).toMatchObject({
			ok: false,
			message: expect.stringContaining('unpacks to more than 1 MB') as string
		});
	});

	it('of 10,000 entries is refused', () => {
		const many = zipSync(
			Object.fromEntries(Array.from({ length: 10_000 }, (_, index) => [`${index}.txt`, md])),
			{ level: 0 }
		);
		expect(refusal(many)).toContain('10000 entries; at most 1000');
	});

	it.each([
		['cut off', zip({ 'article.md': md }).subarray(0, 60)],
		['of other bytes', Buffer.from('PK\x03\x04 and nothing that follows')]
	])('that is %s is refused', (_, bytes) => {
		expect(refusal(bytes)).toContain('damaged');
	});

	it('needs one Markdown file, and says which there are', () => {
		expect(refusal(zip({ 'a.txt': md }))).toContain('no Markdown file');
		expect(refusal(zip({ 'a.md': md, 'b.md': md }))).toContain('several Markdown files (a.md, b.md)');
		expect(refusal(zip({ 'x/a.md': md, '__MACOSX/x/._a.txt': md }))).toBe('taken');
	});

	it('whose pictures are not those that were exported is refused', () => {
		const sums = writeChecksums([
			{ name: 'article.md', sha256: sha256Of(strToU8('other')) },
			{ name: 'pictures/a.webp', sha256: sha256Of(strToU8('a')) }
		]);
		expect(
			refusal(zip({ 'article.md': md, 'checksums.sha256': strToU8(sums), 'pictures/a.webp': strToU8('b') }))
		).toContain('by its list of checksums: pictures/a.webp');
		const changed = readArticleUpload(
			zip({ 'article.md': md, 'checksums.sha256': strToU8(sums), 'pictures/a.webp': strToU8('a') }),
			'x.zip'
		);
		expect(changed).toMatchObject({ ok: true, value: { notes: ['The text was changed after the export.'] } });
	});
});

describe('the head of a file', () => {
	it('comes back as it was written, and the text to the letter', () => {
		const head = {
			title: 'Brisk: "the 360" - what # it # does',
			standfirst: '> not a quote\nbut two lines: yes',
			template: 'tuning-guide',
			campaigns: ['no', '2026', 'aldermoor-1650'],
			revision: { number: 12, name: 'as sent' }
		};
		for (const source of [
			'',
			'\n\nText\n',
			'a\r\nb'.replace('\r', ''),
			'---\ntitle: x\n---\n',
			'no end of line'
		]) {
			const read = readArticleFile(writeArticleFile(head, source));
			if (!read.ok) throw new Error(read.message);
			const { title, standfirst, template, campaigns } = head;
			expect(read.value).toEqual({
				head: { title, standfirst, template, campaigns, tags: [] },
				source,
				unused: []
			});
		}
	});

	it('may be missing: the first heading is the title', () => {
		expect(readArticleFile('# A title\n\nText.')).toMatchObject({
			ok: true,
			value: { head: { title: 'A title' }, source: 'Text.' }
		});
	});

	it.each([
		['---\ntitle: a\nstandfirst: "open\n---\n', /on line [34]/],
		['---\ntitle: a\ntitle: b\n---\n', /on line 3/],
		['---\n\ntemplate: x\ncampaigns: {a: 1}\n---\n', /on line 4: “campaigns”/],
		['---\n- a\n- b\n---\n', /write name: value/],
		['---\ntitle: a\n', /its end is missing/],
		[`---\ntitle: ${'a'.repeat(300)}\n---\n`, /on line 2: “title”. Keep the title to 200/],
		[
			'---\na: &a [1]\nb: &b [*a,*a,*a,*a,*a,*a]\nc: &c [*b,*b,*b,*b,*b,*b]\nd: [*c,*c,*c,*c,*c,*c]\n---\n',
			/too often/
		]
	])('that cannot be read is refused with its line: %j', (text, words) => {
		const read = readArticleFile(text);
		expect(read.ok ? 'taken' : read.message).toMatch(words);
	});

	it('says what it does not use', () => {
		expect(readArticleFile('---\ntitle: a\nlayout: post\nauthor: x\n---\n')).toMatchObject({
			value: { unused: ['layout', 'author'] }
		});
	});
});

it.each([
	['Latin-1', Buffer.from('caf\xe9', 'latin1')],
	['UTF-16', Buffer.from('\ufeffText', 'utf16le')],
	['bytes that no text has', Buffer.from('a\0b')]
])('a text in %s is refused', (_, bytes) => {
	expect(refusal(bytes, 'article.md')).toContain('not text in UTF-8');
});

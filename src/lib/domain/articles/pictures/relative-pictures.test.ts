import { describe, expect, it } from 'vitest';
import { besides, intoStore, outOfStore, relativePictures, repathed } from './relative-pictures';

const source = [
	'![One](img/one.jpg "A title")',
	'![Two](<img/my two.png>) and ![three](./img/three%20x.webp)',
	'![Four][four] and ![outside](https://lab.example/x.jpg) ![stored](/pictures/x.webp)',
	'',
	'`![code](img/code.jpg)`',
	'',
	'[four]: ../four.jpg "Four"'
].join('\n');

describe('pictures that lie beside a text', () => {
	it('are found once each, by where they lie', () => {
		expect(
			relativePictures(`${source}\n\n![One again](img/one.jpg)`, 'post/text.md').map(({ path, alt }) => [
				path,
				alt
			])
		).toEqual([
			['post/img/one.jpg', 'One'],
			['post/img/my two.png', 'Two'],
			['post/img/three x.webp', 'three'],
			['four.jpg', 'Four']
		]);
	});

	it('are put for others where they stand, and nothing else is touched', () => {
		const swapped = repathed(source, (href) => `/pictures/${href.replace(/\W/g, '')}.webp`);
		expect(swapped.split('\n')).toEqual([
			'![One](/pictures/imgonejpg.webp "A title")',
			'![Two](/pictures/imgmytwopng.webp) and ![three](/pictures/imgthreexwebp.webp)',
			'![Four][four] and ![outside](https://lab.example/x.jpg) ![stored](/pictures/x.webp)',
			'',
			expect.stringContaining('![code]('),
			'',
			'[four]: /pictures/fourjpg.webp "Four"'
		]);
		expect(repathed(source, () => undefined)).toBe(source);
	});

	it.each([
		['a/b.md', '../c.jpg', 'c.jpg'],
		['b.md', 'x/../c.jpg', 'c.jpg'],
		['b.md', '../c.jpg', null],
		['a/b.md', '../../etc/passwd', null]
	])('of %s at %s lie at %s', (file, href, path) => {
		expect(besides(file, href)).toBe(path);
	});
});

it('leave the store and come back the same', () => {
	const [known, strange] = ['ab'.repeat(32), 'cd'.repeat(32)];
	const text = `![a](/pictures/${known}.webp "x") https://lab.example/pictures/${known}.webp pictures/plain.webp`;
	const out = outOfStore(text);
	expect(out).toContain(`(pictures/${known}.webp "x") https://lab.example/pictures/${known}.webp`);
	expect(intoStore(out, new Set([known]))).toBe(text);
	expect(intoStore(`![a](pictures/${strange}.webp)`, new Set([known]))).toContain(
		`(pictures/${strange}.webp)`
	);
});

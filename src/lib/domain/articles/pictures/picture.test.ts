import { describe, expect, it } from 'vitest';
import { measuredArticle } from '../../../../../tests/fixtures/article-data';
import { sanitisePage } from '../../../server/rendering/sanitise-page';
import { renderArticle } from '../render-article';
import { picturesIn, servedWidth } from './picture';

const hash = 'ab12'.repeat(16);
const known = { sha256: hash, width: 1800, height: 1200, fallback: 'jpg' as const };
const data = { ...measuredArticle(), pictures: [known] };
const page = (source: string, given = data) => {
	const { html, errors } = renderArticle(source, given, () => '');
	return { html: sanitisePage(html), errors };
};

describe('a stored picture on the page', () => {
	it('is a figure with its caption where it has a paragraph to itself, in the widths there are, with its size', () => {
		const { html } = page(
			`Before.\n\n![A cooler, "open"](/pictures/${hash}.webp "The <second> fan")\n\nAfter.`
		);
		expect(html).toContain('<figure class="picture" data-line="3"><picture>');
		expect(html).toContain(
			`srcset="/pictures/${hash}.webp?w=640 640w, /pictures/${hash}.webp?w=1280 1280w, /pictures/${hash}.webp 1800w"`
		);
		expect(html).toContain(
			`src="/pictures/${hash}.jpg" alt="A cooler, &quot;open&quot;" width="1800" height="1200"`
		);
		expect(html).toContain('<figcaption>The &lt;second&gt; fan</figcaption></figure>');
		expect(html).not.toContain('<p><figure');
	});

	it('stays within its sentence where it is in one', () => {
		const { html } = page(`Look ![here](/pictures/${hash}.webp) now.`);
		expect(html).toMatch(/<p[^>]*>Look <picture>.*<\/picture> now\.<\/p>/);
	});

	it('needs words for those who cannot see it, and must be in the store', () => {
		expect(page(`![](/pictures/${hash}.webp)`).errors[0]?.message).toContain('no text for those');
		const gone = page(`![Gone](/pictures/${hash}.webp)`, {
			...measuredArticle(),
			missingPictures: [hash]
		} as never);
		expect(gone.errors).toEqual([expect.objectContaining({ directive: 'image', line: 1 })]);
	});

	it('is printed plainly where nothing is known of it, as in older editions', () => {
		const { html, errors } = page(`![Old](/pictures/${hash}.webp)`, measuredArticle() as never);
		expect(errors).toEqual([]);
		expect(html).toContain(`<img src="/pictures/${hash}.webp" alt="Old"`);
	});

	it('lets no other address into a page', () => {
		const evil =
			'<picture><source type="image/webp" srcset="//elsewhere.example/x.webp 1w"><img src="/a" alt="a"></picture>';
		expect(sanitisePage(evil)).not.toContain('elsewhere');
	});
});

it('finds the pictures of a text, each once', () => {
	expect(
		picturesIn(`![a](/pictures/${hash}.webp) ![b](/pictures/${hash}.webp) /pictures/short.webp`)
	).toEqual([hash]);
});

it.each([
	[1800, 640, 640],
	[1800, 641, 1280],
	[1800, 1500, 1800],
	[1800, null, 1800],
	[500, 640, 500]
])('of a picture %d px wide, %s px asked for, the file of %d px is served', (width, wanted, served) => {
	expect(servedWidth(width, wanted)).toBe(served);
});

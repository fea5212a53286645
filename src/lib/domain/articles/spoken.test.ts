import { describe, expect, it } from 'vitest';
import { measuredArticle } from '../../../../tests/fixtures/article-data';
import { parseMarkdown } from './markdown';
import { plainText } from './plain-text';
import { Setting } from './setting';

/** What a narrator is given for a source, unbreakable spaces as plain ones. */
function spoken(source: string): string {
	const data = {
		...measuredArticle(),
		glossary: [{ slug: 'boost', term: 'boost', explanation: 'A clock above the rated one.' }]
	};
	const tokens = parseMarkdown(source);
	const { errors } = new Setting(data, () => '', 'plates/').set(tokens);
	expect(errors).toEqual([]);
	return plainText(tokens, 'spoken').replaceAll('\u00a0', ' ');
}

describe('how a narrator says what stands in containers and on lines', () => {
	it.each([
		['::contents\n\n## Set it\n\nText[^1].\n\n[^1]: Small print.', 'Set it\n\nText.'],
		[':::step{title="Open the menu"}\nIt is the third.\n:::', 'Step 1. Open the menu.\n\nIt is the third.'],
		['Our words.\n\n:::pull\nOur words.\n:::', 'Our words.'],
		[':::pull{by="Ada Stern"}\nIt holds.\n:::', 'Ada Stern: “It holds.”'],
		[':::gallery\n![The loop](/pictures/a.webp "Filled")\n:::', '[Pictures: The loop]'],
		['A :term{name=boost}.', 'A boost.'],
		[
			':::compare{title="Which?"}\n:::side{title="By hand"}\nSlow.\n:::\n:::side{title="By the board"}\nFast.\n:::\n:::',
			'Which?\n\nBy hand.\n\nSlow.\n\nBy the board.\n\nFast.'
		]
	])('%j', (source, words) => {
		expect(spoken(source)).toBe(words);
	});

	it('says of a verdict what it is held against, and for whom', () => {
		const words = spoken(':::verdict{profile=huge-pages for="long builds"}\nSo.\n:::');
		expect(words).toMatch(/^The verdict: Huge pages, against Stock\.\n\nOverall: [+−]\d/);
		expect(words).toMatch(/So\.\n\nGood for: long builds$/);
	});

	it('says of a trade-off table what is gained and given up, not its cells', () => {
		expect(spoken('::tradeoffs{profiles=huge-pages}')).toMatch(/^Huge pages, against Stock\. /);
	});
});

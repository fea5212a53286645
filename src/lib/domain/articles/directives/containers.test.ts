import { describe, expect, it } from 'vitest';
import { measuredArticle } from '../../../../../tests/fixtures/article-data';
import { renderArticle } from '../render-article';

const render = (source: string) => renderArticle(source, measuredArticle(), () => '<svg></svg>');
const faults = (source: string) =>
	render(source).errors.map(({ line, directive, message }) => [line, directive, message.slice(0, 60)]);

describe('a container', () => {
	it('holds another, each closed by its own :::, and tells the lines of what is inside', () => {
		const { html, errors } = render(
			':::compare{title="Which?"}\n:::side{title="By hand"}\n\nSlow.\n:::\n:::side{title="By the board"}\nFast, :reading{workload=source-build profile=stock}.\n:::\n:::\n\nAfter.'
		);
		expect(errors).toEqual([]);
		expect(html).toMatch(/<section class="compare compare-2"[^>]*aria-label="Which\?"/);
		expect(
			[...html.matchAll(/class="compare-side"[^>]*data-line="(\d+)"/g)].map((match) => match[1])
		).toEqual(['2', '6']);
		expect(html).toContain('<p data-line="4">Slow.</p>');
		expect(html).toContain('<p data-line="11">After.</p>');
	});

	it.each([
		[':::pull\n::plate{kind=gains}\n:::', 2, 'plate', '“plate” cannot stand in “pull”. It holds text alone.'],
		[':::step{title=a}\nText\n\n::results\n:::', 4, 'results', 'It may hold caution, plate, gallery.'],
		[':::note\n:::note\na\n:::\n:::', 2, 'note', '“note” cannot stand in “note”.'],
		[':::side{title=a}\nText\n:::', 1, 'side', 'makes sense in “compare” alone'],
		[':::note\n::contents\n:::', 2, 'contents', 'cannot stand in “note”'],
		['::note', 1, 'note', 'then ::: on a line of its own'],
		[':::kit\na\n:::', 1, 'kit', 'on a line of its own: write ::kit'],
		[':::nte\na\n:::', 1, 'nte', 'no directive called “nte”'],
		[':::note\n\n:::', 1, 'note', 'nothing in this “note”'],
		[':::step\nText\n:::', 1, 'step', 'needs title='],
		[':::compare\n:::side{title=a}\nb\n:::\n:::', 1, 'compare', 'two to 4 columns'],
		[
			':::compare\nText\n:::side{title=a}\nb\n:::\n:::side{title=a}\nb\n:::\n:::',
			1,
			'compare',
			'nothing beside them'
		],
		[':::gallery\nText ![A rig](/pictures/a.webp)\n:::', 1, 'gallery', 'holds pictures alone'],
		[':::gallery\n![](/pictures/a.webp)\n:::', 2, 'image', 'no text for those'],
		[':::note\nopen', 1, 'note', 'This is not closed.'],
		[`:::note\n${'word '.repeat(2000)}\n:::`, 1, 'note', 'within 8000 characters'],
		[':::verdict{profile=stock}\nText\n:::', 1, 'verdict', 'no verdict on Stock over Stock']
	])('%j is an error in its place', (source, line, directive, words) => {
		const { errors, html } = render(source);
		expect(errors.length).toBeGreaterThan(0);
		const error = errors.find((one) => one.directive === directive);
		expect(error?.message).toContain(words);
		expect(error?.line).toBe(line);
		expect(html).toContain('directive-error');
	});

	it('at fault keeps what was written in it on the page', () => {
		expect(render(':::nte\nStill **here**.\n:::').html).toContain('Still <strong>here</strong>.');
	});

	it('deeper than three levels is refused where it begins', () => {
		const deep = ':::note\n'.repeat(4) + 'a\n' + ':::\n'.repeat(4);
		expect(faults(deep)[0]).toEqual([
			1,
			'note',
			'This is not closed, or holds containers deeper than 3 levels'
		]);
	});

	it('does not take ::: in code for its end', () => {
		const { html, errors } = render(':::note\n```\n:::\n```\nstill in\n:::\n\nout');
		expect(errors).toEqual([]);
		expect(html).toMatch(/<aside[^>]*>.*still in<\/p><\/aside>.*out/s);
	});
});

describe('step cards', () => {
	const source =
		'## Set it\n\n:::step{title="Write it down"}\nAll of it.\n:::\n\n:::step{title="Raise the limit"}\nBy ten.\n\n::caution{topic=power}\n:::\n\n## Test it\n\n:::step{title="Run it"}\nA night.\n:::';
	it('are numbered from each heading on, the caution inside', () => {
		const { html, cautions, errors } = render(source);
		expect(errors).toEqual([]);
		expect([...html.matchAll(/aria-label="(Step \d: [^"]+)"/g)].map((match) => match[1])).toEqual([
			'Step 1: Write it down',
			'Step 2: Raise the limit',
			'Step 1: Run it'
		]);
		expect(cautions).toEqual(['power']);
		expect(html).toMatch(/step-card-body"><p[^>]*>By ten\.<\/p><aside class="caution"/);
	});
});

describe('pull quotes, galleries and contents', () => {
	it('say by whom', () => {
		expect(render(':::pull{by="Ada Stern, tester"}\nIt **holds**.\n:::').html).toBe(
			'<figure class="pull" data-line="1"><blockquote><p data-line="2">It <strong>holds</strong>.</p></blockquote><figcaption>Ada Stern, tester</figcaption></figure>'
		);
	});
	it('take captions from the pictures’ titles, and keep their texts for those who cannot see', () => {
		const { html, plain, errors } = render(
			':::gallery{columns=3}\n![The loop](/pictures/a.webp "Filled & bled")\n![The fans](/pictures/b.webp)\n:::'
		);
		expect(errors).toEqual([]);
		expect(html).toContain(
			'<figure><img src="/pictures/a.webp" alt="The loop" loading="lazy"><figcaption>Filled &amp; bled</figcaption></figure><figure><img src="/pictures/b.webp" alt="The fans" loading="lazy"></figure>'
		);
		expect(plain).toBe('The loop. Filled & bled\n\nThe fans');
	});
	it('list the headings wherever they stand, with links that lead there', () => {
		const { html, errors } = render('::contents{depth=3}\n\n## One\n\n### Part *a*\n\n## Two\n\n#### Deep\n');
		expect(errors).toEqual([]);
		expect(html).toContain(
			'<ol><li><a href="#s-one">One</a><ol><li><a href="#s-part-a">Part a</a></li></ol></li><li><a href="#s-two">Two</a></li></ol>'
		);
		expect(faults('::contents')).toEqual([
			[1, 'contents', 'There are no headings to list. A heading begins with ## and ']
		]);
	});
});

import { JSDOM } from 'jsdom';
import { describe, expect, it, vi } from 'vitest';
import { measuredArticle } from '../../../../tests/fixtures/article-data';
import type { ArticleData } from '../../domain/articles/data';
import { renderArticle } from '../../domain/articles/render-article';
import { sanitiseConfig } from '../../domain/articles/sanitise-config';
import { drawPlate } from './draw-plate';
import { freezeEdition } from './freeze-edition';
import { sanitisePage } from './sanitise-page';

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000 });

/**
 * Outside checks: shapes of attack from public lists, the mutation ones as they were published with the
 * sanitiser's own past bypasses (namespace confusion through math and svg, noscript, template, textarea,
 * comments in style and title) and from the usual cheat sheets; written from memory.
 */
const attacks = [
	'<script>alert(1)</script>',
	'<img src=x onerror=alert(1)>',
	'<svg onload=alert(1)>',
	'<svg><script>alert(1)</script></svg>',
	'<svg><a xlink:href="javascript:alert(1)"><text>x</text></a></svg>',
	'<svg><animate onbegin=alert(1) attributeName=x dur=1s>',
	'<svg><use href="data:image/svg+xml,<svg id=x xmlns=http://www.w3.org/2000/svg><script>alert(1)</script></svg>#x">',
	'<svg><foreignObject><iframe src="javascript:alert(1)"></iframe></foreignObject></svg>',
	'<svg><style><img src=x onerror=alert(1)></style></svg>',
	'<svg></p><style><a title="</style><img src onerror=alert(1)>">',
	'<svg><title><style><!--</style><img src=x onerror=alert(1)>--></title></svg>',
	'<svg><desc><![CDATA[</desc><script>alert(1)</script>]]></svg>',
	'<math><mtext><table><mglyph><style><!--</style><img title="--&gt;&lt;img src=1 onerror=alert(1)&gt;">',
	'<form><math><mtext></form><form><mglyph><style></math><img src onerror=alert(1)>',
	'<math><annotation-xml encoding="text/html"><style><img src=x onerror=alert(1)></style></annotation-xml></math>',
	'<noscript><p title="</noscript><img src=x onerror=alert(1)>">',
	'<textarea><img title="</textarea><img src=x onerror=alert(1)>">',
	'<xmp><p title="</xmp><svg/onload=alert(1)>">',
	'<template><script>alert(1)</script></template>',
	'<iframe srcdoc="<script>alert(1)</script>"></iframe>',
	'<a href="javascript:alert(1)">x</a>',
	'<a href="java&#10;script:alert(1)">x</a>',
	'<a href=" &#14; javascript:alert(1)">x</a>',
	'<img src="data:image/svg+xml;base64,PHN2ZyBvbmxvYWQ9YWxlcnQoMSk+">',
	'<base href="https://elsewhere.example/">',
	'<meta http-equiv=refresh content="0;url=javascript:alert(1)">',
	'<input autofocus onfocus=alert(1)>',
	'<details open ontoggle=alert(1)>',
	'<p style="background:url(javascript:alert(1))">x</p>',
	'<link rel=stylesheet href="https://elsewhere.example/x.css">',
	'<rect fill="url(https://elsewhere.example/x.svg#a)">',
	'"><img src=x onerror=alert(1)>',
	"' onmouseover=alert(1) x='",
	'</title></svg><script>alert(1)</script>',
	']]><script>alert(1)</script>',
	'{{constructor.constructor("alert(1)")()}}'
];

const allowed = new Set<string>(sanitiseConfig.ALLOWED_TAGS);
const { document } = new JSDOM('').window;

/** Attributes that are read out as words and never followed. */
const spoken = new Set(['title', 'alt', 'aria-label']);

/** What of a page could run, load or lead elsewhere; empty for a safe one. */
function dangers(html: string): string[] {
	const box = document.createElement('div');
	box.innerHTML = html;
	return [...box.querySelectorAll('*')].flatMap((node) => {
		const tag = node.tagName.toLowerCase();
		const found = allowed.has(tag) ? [] : [`<${tag}>`];
		for (const { name, value } of node.attributes) {
			if (spoken.has(name)) continue;
			if (/^on/i.test(name) || name === 'style' || /javascript:|data:/i.test(value))
				found.push(`${tag} ${name}=${value}`);
			if (/^(?:src|href|xlink:href)$/.test(name) && !/^(?:\/(?!\/)|#|https?:|mailto:|plates\/)/.test(value)) {
				found.push(`${tag} ${name}=${value}`);
			}
			if (/url\(/i.test(value)) found.push(`${tag} ${name}=${value}`);
		}
		return found;
	});
}

const everything =
	'::kit\n\n::steps{profile=huge-pages}\n\n::results\n\n::plate{kind=gains}\n\n::plate{kind=scores workload=source-build}\n\n::disclosure\n\n::tested\n\n::tradeoffs\n\n::contents\n\n## Head\n\n:::verdict{profile=huge-pages for=a not=b}\nSo.\n:::\n\n:::step{title=Do}\nIt[^1].\n\n::caution{topic=power}\n:::\n\n:::compare\n:::side{title=a}\nb\n:::\n:::side{title=c}\nd\n:::\n:::\n\n:::pull{by=Ada}\nYes.\n:::\n\n:::gallery\n![A rig](/pictures/a.webp "Its fans")\n:::\n\n:term{name=boost}\n\n[^1]: Twice.\n\n:reading{workload=source-build profile=stock} :gain{workload=source-build profile=huge-pages} :overall{profile=huge-pages}';

/** The fixture's data with a term to name. */
const withTerms = (): ArticleData => ({
	...measuredArticle(),
	glossary: [{ slug: 'boost', term: 'boost', explanation: 'A clock above the rated one.' }]
});

const written = new Set([
	...[
		'name',
		'unit',
		'programVersion',
		'settings',
		'quantity',
		'notes',
		'menuPath',
		'setting',
		'value',
		'note'
	],
	...[
		'parentValue',
		'stockValue',
		'partName',
		'firmware',
		'driver',
		'os',
		'disclosure',
		'how',
		'signedBy',
		'term',
		'explanation'
	]
]);

/** The data with an attack in every text that a person can type, another one in each, beginning with the `turn`th. */
function poisoned(data: ArticleData, turn: number): ArticleData {
	let next = turn;
	const walk = (value: unknown, key: string): unknown => {
		if (typeof value === 'string') return written.has(key) ? attacks[next++ % attacks.length] : value;
		if (Array.isArray(value)) return value.map((item) => walk(item, key === 'testers' ? 'name' : key));
		if (value === null || typeof value !== 'object') return value;
		return Object.fromEntries(Object.entries(value).map(([name, inner]) => [name, walk(inner, name)]));
	};
	return walk(data, '') as ArticleData;
}

describe('the sanitiser', () => {
	it.each(attacks)('leaves nothing that runs of %s', (attack) => {
		const clean = sanitisePage(attack);
		expect(dangers(clean)).toEqual([]);
		// What comes out is parsed once more by the reader's browser: it must not turn into something else.
		expect(sanitisePage(clean)).toBe(clean);
	});
	it('keeps a page of ours as it is', () => {
		const { html } = renderArticle(everything, withTerms(), drawPlate);
		const clean = sanitisePage(html);
		expect(dangers(clean)).toEqual([]);
		const text = (page: string) => {
			const box = document.createElement('div');
			box.innerHTML = page;
			return [
				box.textContent,
				box.querySelectorAll('*').length,
				[...box.querySelectorAll('*')].map((node) => node.attributes.length)
			];
		};
		expect(text(clean)).toEqual(text(html));
	});
	it('keeps images of this site and refuses all others', () => {
		expect(sanitisePage('<img src="/files/a.png" alt="A rig">')).toBe('<img src="/files/a.png" alt="A rig">');
		expect(sanitisePage('<img src="https://elsewhere.example/a.png" alt="x">')).toBe('<img alt="x">');
		expect(sanitisePage('<img src="data:image/png;base64,AAAA" alt="x">')).toBe('<img alt="x">');
	});
});

describe('what people type', () => {
	it.each(attacks)('is text in prose: %s', (attack) => {
		const { html } = renderArticle(
			`Before ${attack} after\n\n${attack}\n\n> ${attack}`,
			measuredArticle(),
			drawPlate
		);
		const clean = sanitisePage(html);
		expect(dangers(clean)).toEqual([]);
		const box = document.createElement('div');
		box.innerHTML = clean;
		// Shown, not swallowed.
		expect(box.textContent).toContain('Before');
		expect(box.textContent).toContain('after');
	});
	it.each(attacks)('is text in the attributes of directives: %s', (attack) => {
		const bare = attack.replace(/[{}"]/g, '');
		const source = `::plate{kind=gains title="${bare}"}\n\n:reading{workload="${bare}" profile=${bare.replace(/\s/g, '')}}\n\n:::note{title="${bare}"}\nText.\n:::\n\n:::verdict{profile=huge-pages title="${bare}" for="${bare}" not="${bare}"}\nText.\n:::\n\n:::step{title="${bare}"}\nText.\n:::\n\n:::pull{by="${bare}"}\nText.\n:::\n\n:term{name="${bare}"}`;
		expect(dangers(sanitisePage(renderArticle(source, measuredArticle(), () => '').html))).toEqual([]);
	});
	it.each([0, 9, 18, 27])('is text in every field of the data, from attack %i on', (turn) => {
		const data = poisoned(withTerms(), turn);
		const { page, plates, facts } = freezeEdition({
			slug: 'a',
			title: 'A',
			standfirst: '',
			source: everything,
			data
		});
		expect(dangers(page)).toEqual([]);
		expect(facts.errors).toEqual([]);
		for (const { svg } of plates) {
			// A file of its own must be well-formed XML, and nothing but shapes and words.
			const file = new JSDOM(svg, { contentType: 'image/svg+xml' }).window.document;
			const names = [...file.querySelectorAll('*')].map((node) => node.localName);
			expect(
				[...new Set(names)].filter(
					(name) => !['svg', 'style', 'g', 'path', 'rect', 'text', 'title', 'desc'].includes(name)
				)
			).toEqual([]);
			expect(file.querySelectorAll('style')).toHaveLength(1);
		}
	});
});

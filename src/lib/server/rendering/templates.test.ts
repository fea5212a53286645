import { describe, expect, it, vi } from 'vitest';
import { measuredArticle, measuredCampaign } from '../../../../tests/fixtures/article-data';
import { fillTemplate } from '../../domain/articles/fill-template';
import { renderArticle } from '../../domain/articles/render-article';
import { shippedTemplates, shippedTemplate } from './templates';

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000 });

describe('templates', () => {
	it('ship, with their heads', () => {
		expect(shippedTemplates.map((template) => template.kind)).toEqual([
			'tuning-guide',
			'product-test',
			'comparison',
			'short-note'
		]);
	});
	it.each(shippedTemplates)('$kind begins with directives that all find their data', ({ body }) => {
		const source = fillTemplate(body, measuredArticle());
		expect(source).not.toMatch(/\{\{|\n\n\n/);
		const { errors, plates, hasDisclosure } = renderArticle(source, measuredArticle(), () => '');
		expect(errors).toEqual([]);
		expect(plates.length).toBeGreaterThan(0);
		expect(hasDisclosure).toBe(true);
	});
	it.each(shippedTemplates)('$kind says which campaign where there are several', ({ body }) => {
		const second = { ...measuredCampaign(), slug: 'again' };
		const data = { ...measuredArticle(), campaigns: [measuredCampaign(), second] };
		const { errors, uses } = renderArticle(fillTemplate(body, data), data, () => '');
		expect(errors).toEqual([]);
		expect([...uses.campaigns].sort()).toEqual(['again', 'two-cores']);
	});
	it.each(shippedTemplates)(
		'$kind has things to look at in the data, the prose and the law',
		({ checklist }) => {
			const groups = new Set(checklist.map(({ group }) => group));
			expect([...groups]).toEqual(expect.arrayContaining(['data', 'prose', 'law']));
		}
	);
	it('put a separator between repeats', () => {
		const source = fillTemplate(
			'{{#campaigns}}\nA {{#profiles}}{{profile}}{{/profiles, }} b.\n{{/campaigns}}\n',
			measuredArticle()
		);
		expect(source).toBe('A single-core, no-vector-crypto, huge-pages b.\n');
	});
	it('take no marks from names', () => {
		const campaign = measuredCampaign();
		const first = campaign.workloads[0];
		if (first) first.name = 'A*b* :reading{x} <i>';
		const data = { ...measuredArticle(), campaigns: [campaign] };
		const { html, errors } = renderArticle(
			fillTemplate('{{#campaigns}}{{#workloads}}{{workload.name}} {{/workloads}}{{/campaigns}}', data),
			data,
			() => ''
		);
		expect(errors).toEqual([]);
		expect(html).toContain('A*b* :reading{x} &lt;i&gt;');
	});
	it('are found by kind', () => {
		expect(shippedTemplate('comparison')?.for).toContain('held against each other');
		expect(shippedTemplate('poem')).toBeUndefined();
	});
});

import { describe, expect, it } from 'vitest';
import type { CellFigures } from '../../bench/figures';
import type { ArticleData, CampaignData, SampleDuty, SettingFact } from '../data';
import { renderArticle } from '../render-article';
import { allChecks, blocking, preflight, printChecks } from './all-checks';
import { listed, type OpenComment } from './finding';

const now = new Date('2026-11-11T08:00:00Z');

const cell = (profile: string, more: Partial<CellFigures> = {}): CellFigures => ({
	profile,
	workload: 'tile-render',
	needed: 5,
	summary: {
		n: 5,
		mean: 31.2,
		median: 31.2,
		min: 31.1,
		max: 31.3,
		sd: 0.07,
		cvPercent: 0.23,
		ci95: [31.11, 31.29],
		flagged: [],
		headline: 31.2
	},
	comparison: null,
	signedBy: 'Tomas Reyl',
	signedAt: '2026-11-10T08:00:00.000Z',
	testers: ['Tomas Reyl'],
	from: null,
	to: null,
	ambientC: 21,
	...more
});

const voltage: SettingFact = {
	menuPath: 'Tuning > Voltages',
	setting: 'Core voltage',
	value: '1.24',
	unit: 'V',
	quantity: 'core-voltage',
	note: '',
	parentValue: '1.17',
	stockValue: '1.17'
};

interface Change {
	cells?: CellFigures[];
	settings?: SettingFact[];
	duties?: SampleDuty[];
}

function dataWith({
	cells = [cell('stock'), cell('fixed')],
	settings = [],
	duties = []
}: Change = {}): ArticleData {
	const campaign: CampaignData = {
		slug: 'first-look',
		name: 'First look',
		rig: { slug: 'n-12', name: 'N-12', revision: 1, firmware: '', driver: '', os: '' },
		kit: [],
		profiles: [
			{ slug: 'stock', name: 'Stock', parent: null, notes: '', settings: [], derived: [] },
			{ slug: 'fixed', name: 'Fixed 4.95', parent: 'stock', notes: '', settings, derived: [] }
		],
		workloads: [
			{
				slug: 'tile-render',
				name: 'Tile render',
				programVersion: '',
				settings: '',
				quantity: 'time',
				unit: 's',
				better: 'lower',
				class: 'all-core',
				headline: 'mean',
				leastDifferencePercent: 1,
				warmUps: 1,
				repeats: 5,
				coolDownS: 0
			}
		],
		baseline: 'stock',
		cells,
		overall: {}
	};
	return { campaigns: [campaign], duties, zone: 'Europe/Oslo' };
}

interface Asked extends Change {
	source?: string;
	title?: string;
	standfirst?: string;
	comments?: OpenComment[];
	printAt?: Date | null;
}

const reading = 'It renders in :reading{workload=tile-render profile=fixed}.';

function found({
	source = reading,
	title = 'Four ways',
	standfirst = 'In short.',
	comments = [],
	printAt = null,
	...change
}: Asked = {}) {
	const data = dataWith(change);
	const page = renderArticle(source, data, () => '');
	return preflight({ title, standfirst, source, page, data, blockingComments: comments, printAt, now });
}
const checks = (asked: Asked, severity: 'blocking' | 'advice' = 'blocking') =>
	found(asked)
		.filter((finding) => finding.severity === severity)
		.map((finding) => finding.check);

const duty = (more: Partial<SampleDuty>): SampleDuty => ({
	sample: 'n-101',
	partName: 'Aldermoor 1650',
	provenance: 'loaned',
	disclosure: 'Lent by its maker.',
	embargoes: [],
	...more
});

describe('preflight', () => {
	it('finds nothing in an article that is in order', () => {
		expect(found()).toEqual([]);
	});

	it('stops a directive that finds nothing, at its line and with the nearest names', () => {
		const [finding] = found({ source: `${reading}\n\n:reading{workload=tile-rendr profile=fixed}` });
		expect(finding).toMatchObject({ check: 'directives', place: { kind: 'line', line: 3 } });
		expect(finding?.mend).toContain('tile-render');
	});

	it('stops data that nobody signed off, but only where the article shows it', () => {
		const cells = [cell('stock', { signedBy: null }), cell('fixed')];
		expect(checks({ cells })).toEqual([]);
		const [finding] = found({ cells, source: ':reading{workload=tile-render profile=stock}' });
		expect(finding).toMatchObject({ check: 'sign-off', place: { kind: 'campaign', campaign: 'first-look' } });
		expect(finding?.message).toContain('Tile render with Stock is not signed off');
	});

	it('stops data of which every run is voided: there is no figure to print', () => {
		expect(checks({ cells: [cell('stock'), cell('fixed', { summary: null, signedBy: null })] })).toEqual([
			'directives'
		]);
	});

	it('stops a slot before an embargo ends, to the minute, and only advises while there is no slot', () => {
		const embargoes = [{ field: 'results' as const, until: '2026-11-13T13:00:00.000Z' }];
		const duties = [duty({ provenance: 'bought', embargoes })];
		expect(checks({ duties, printAt: new Date('2026-11-13T12:59:00Z') })).toEqual(['embargo']);
		expect(checks({ duties, printAt: new Date('2026-11-13T13:00:00Z') })).toEqual([]);
		expect(checks({ duties })).toEqual([]);
		expect(checks({ duties }, 'advice')).toEqual(['embargo']);
		expect(found({ duties })[0]?.message).toContain('Friday 13 November 2026, 14:00 (CET)');
	});

	it.each(['loaned', 'given', 'pre-production'] as const)(
		'stops a %s sample without a disclosure, and a loan without words agreed for it',
		(provenance) => {
			const duties = [duty({ provenance })];
			expect(checks({ duties })).toEqual(['disclosure']);
			expect(checks({ duties, source: `${reading}\n\n::disclosure` })).toEqual([]);
			expect(
				checks({ duties: [duty({ provenance, disclosure: null })], source: `${reading}\n\n::disclosure` })
			).toEqual(provenance === 'loaned' ? ['disclosure'] : []);
		}
	);

	it('asks no disclosure for a sample that was bought', () => {
		expect(checks({ duties: [duty({ provenance: 'bought', disclosure: null })] })).toEqual([]);
	});

	it('stops numbers of a profile with a raised voltage and no caution about it', () => {
		const [finding] = found({ settings: [voltage] });
		expect(finding).toMatchObject({ check: 'caution', severity: 'blocking' });
		expect(finding?.message).toContain('Fixed 4.95 raises a voltage (Core voltage)');
		expect(finding?.mend).toContain('::caution{topic=voltage}');
		expect(checks({ settings: [voltage], source: `${reading}\n\n::caution{topic=voltage}` })).toEqual([]);
		expect(checks({ settings: [voltage], source: `${reading}\n\n::caution{topic=heat}` })).toEqual([
			'caution'
		]);
		expect(checks({ settings: [{ ...voltage, value: '1.10' }] })).toEqual([]);
	});

	it('stops an image without a text alternative', () => {
		expect(checks({ source: '![](/media/rig.jpg)' })).toEqual(['images']);
		expect(checks({ source: '![The rig, lid off](/media/rig.jpg)' })).toEqual([]);
	});

	it('stops a number that contradicts the data, at its line, with what the bench has', () => {
		const source = `${reading}\n\nThe tile render takes 33.4 s with fixed 4.95.`;
		const [finding] = found({ source });
		expect(finding).toMatchObject({
			check: 'contradictions',
			severity: 'blocking',
			place: { kind: 'line', line: 3 }
		});
		expect(finding?.message).toContain('“33.4 s” contradicts the bench. Tile render, Fixed 4.95: 31.200');
		expect(finding?.mend).toContain(':reading{workload=tile-render profile=fixed}');
		expect(checks({ source: `${reading}\n\nThe tile render takes 31.2 s with fixed 4.95.` })).toEqual([]);
	});

	it('only advises on numbers that nothing backs, and on words that say more than the verdicts', () => {
		const comparison = {
			ratio: 1.002,
			ci95: [0.999, 1.005] as [number, number],
			gainPercent: 0.2,
			gainCi95: [-0.1, 0.5] as [number, number],
			verdict: 'no-difference' as const
		};
		const cells = [cell('stock'), cell('fixed', { comparison })];
		const source = `${reading}\n\nThe tile render is faster with fixed 4.95. The pump draws 4 W, the lamp 9 W.`;
		expect(checks({ cells, source })).toEqual([]);
		const advice = found({ cells, source });
		expect(advice.map((one) => one.check)).toEqual(['overstatements', 'unbacked-numbers']);
		expect(advice[0]?.message).toContain('No difference that matters');
		expect(advice[1]?.message).toContain(
			'2 numbers are not backed by the data: “4 W” (line 3), “9 W” (line 3).'
		);
	});

	it('stops at a blocking comment, and leads to it', () => {
		const comments = [{ id: 7, quote: 'renders in', body: 'At what temperature?', authorName: 'Marit Oake' }];
		expect(found({ comments })).toMatchObject([{ check: 'comments', place: { kind: 'comment', id: 7 } }]);
	});

	it('advises on few readings, wide intervals, a missing standfirst and a long title', () => {
		const summary = cell('fixed').summary;
		const few = cell('fixed', { summary: summary && { ...summary, n: 3 } });
		expect(checks({ cells: [cell('stock'), few] }, 'advice')).toEqual(['readings-needed']);
		const wide = cell('fixed', { summary: summary && { ...summary, ci95: [30.2, 32.2] } });
		expect(checks({ cells: [cell('stock'), wide] }, 'advice')).toEqual(['wide-intervals']);
		expect(checks({ standfirst: ' ' }, 'advice')).toEqual(['standfirst']);
		expect(checks({ title: 'x'.repeat(81) }, 'advice')).toEqual(['title-length']);
	});

	it('puts what blocks first', () => {
		const findings = found({ standfirst: '', cells: [cell('stock'), cell('fixed', { signedBy: null })] });
		expect(findings.map((finding) => finding.severity)).toEqual(['blocking', 'advice']);
		expect(blocking(findings)).toHaveLength(1);
	});

	it('asks a frozen edition again only about duties and comments', () => {
		expect(printChecks.every((check) => allChecks.includes(check))).toBe(true);
		const data = dataWith({ cells: [cell('stock'), cell('fixed', { signedBy: null })] });
		const page = renderArticle(reading, data, () => '');
		const input = {
			title: '',
			standfirst: '',
			source: 'It renders in 99 s with fixed 4.95.',
			page,
			data,
			blockingComments: [],
			printAt: now,
			now
		};
		expect(preflight(input, printChecks)).toEqual([]);
	});
});

describe('names in a sentence', () => {
	it('are joined, and counted past a few', () => {
		expect(listed(['a'])).toBe('a');
		expect(listed(['a', 'b'])).toBe('a and b');
		expect(listed(['a', 'b', 'c', 'd', 'e', 'f'])).toBe('a, b, c, d and 2 more');
	});
});

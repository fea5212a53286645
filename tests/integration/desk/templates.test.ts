import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { articleStart } from '../../../src/lib/schemas/article';
import { templateEdit, templateInput } from '../../../src/lib/schemas/template';
import { auditEvent } from '../../../src/lib/server/db/schema';
import { checkItem } from '../../../src/lib/server/services/articles/check-item';
import { readReview } from '../../../src/lib/server/services/articles/read-review';
import { readStart } from '../../../src/lib/server/services/articles/read-start';
import {
	listTemplates,
	previewTemplate,
	showTemplate
} from '../../../src/lib/server/services/articles/read-templates';
import { startArticle } from '../../../src/lib/server/services/articles/start-article';
import {
	createTemplate,
	editTemplate,
	restoreTemplate,
	retireTemplate
} from '../../../src/lib/server/services/articles/write-template';
import * as revisions from '../../../src/lib/server/db/queries/revision';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { rowOf, slug, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign } from './measured-campaign';

const campaign = 'aldermoor-1650-first-look';
let database: TestDatabase;
let all: People;

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	all = await people(database.db);
	await measuredCampaign(database.db, all.tester);
});

const as = (who: keyof People) => contextFor(database.db, all[who]);
const text = (more: object = {}) => ({
	name: 'Board report',
	title: 'A board: what its menus hold',
	for: 'A board, menu by menu.',
	body: '{{#campaigns}}\n::plate{kind=gains over={{baseline}}{{of}}}\n{{/campaigns}}\n',
	checklist: 'data: All cells signed\nlaw: Cautions stand beside their steps\n',
	...more
});
const edit = (version: number, more: object = {}) => templateEdit.parse({ ...text(more), version });
const shown = async (kind: string) => wanted(await showTemplate(as('editor'), kind));
const offered = async () => wanted(await readStart(as('writer'))).templates.map(({ value }) => value);

describe('templates', () => {
	it('are the files that ship until an editor changes them, and go back to them as one more save', async () => {
		const before = await shown('short-note');
		expect(before.template.own).toBeNull();
		wanted(await editTemplate(as('editor'), 'short-note', edit(0, { name: 'Finding' })));
		expect(await editTemplate(as('editor'), 'short-note', edit(0))).toMatchObject({ reason: 'conflict' });
		expect(wanted(await readStart(as('writer'))).templates).toContainEqual({
			value: 'short-note',
			label: 'Finding',
			what: 'A board, menu by menu.'
		});
		wanted(await restoreTemplate(as('editor'), 'short-note', { version: 1 }));
		const after = await shown('short-note');
		expect(after.template.body).toBe(before.template.body);
		expect(after.template.checklist).toEqual(before.template.checklist);
		expect(after.saves.map(({ number, note }) => [number, note])).toEqual([
			[2, 'as it ships'],
			[1, '']
		]);
	});

	it('are changed by editors alone', async () => {
		for (const who of ['writer', 'tester', 'admin', 'liaison'] as const) {
			expect(await editTemplate(as(who), 'short-note', edit(0))).toMatchObject({ reason: 'forbidden' });
			expect(await createTemplate(as(who), templateInput.parse(text()))).toMatchObject({
				reason: 'forbidden'
			});
		}
		expect(await listTemplates(as('liaison'))).toMatchObject({ reason: 'forbidden' });
	});

	it('are added, begun from and taken out of use', async () => {
		wanted(await createTemplate(as('editor'), templateInput.parse(text())));
		expect(await createTemplate(as('editor'), templateInput.parse(text()))).toMatchObject({
			reason: 'conflict',
			fields: { kind: [expect.any(String)] }
		});
		expect(
			await createTemplate(as('editor'), templateInput.parse(text({ kind: 'short-note' })))
		).toMatchObject({
			reason: 'conflict'
		});
		expect(await offered()).toContain('board-report');
		const start = articleStart.parse({ title: 'A board', template: 'board-report', campaigns: [campaign] });
		wanted(await startArticle(as('writer'), start));
		const row = await rowOf(database.db, 'a-board');
		expect((await revisions.byNumber(database.db, row.id, 1))?.source).toBe(
			'::plate{kind=gains over=stock}\n'
		);
		wanted(await retireTemplate(as('editor'), 'board-report', { retired: 'yes', version: 1 }));
		wanted(await retireTemplate(as('editor'), 'short-note', { retired: 'yes', version: 0 }));
		expect(await offered()).toEqual(['tuning-guide', 'product-test', 'comparison']);
		expect(await startArticle(as('writer'), { ...start, title: 'Another' })).toMatchObject({
			reason: 'invalid',
			fields: { template: [expect.any(String)] }
		});
		wanted(await retireTemplate(as('editor'), 'short-note', { retired: 'no', version: 2 }));
		expect(await offered()).toContain('short-note');
		const acts = (await database.db.select().from(auditEvent)).map(({ act }) => act);
		expect(acts.filter((act) => act.startsWith('template.'))).toEqual([
			'template.create',
			'template.retire',
			'template.retire',
			'template.retire'
		]);
	});

	it('are shown as an article begins from them, faults included', async () => {
		const { html, errors, source } = wanted(await previewTemplate(as('tester'), 'short-note', campaign));
		expect(errors).toEqual([]);
		expect(html).toContain('class="plate');
		expect(source).not.toContain('{{');
		wanted(await editTemplate(as('editor'), 'short-note', edit(0, { body: '::plate{kind=nothing}' })));
		expect(wanted(await previewTemplate(as('editor'), 'short-note', '')).errors).toMatchObject([{ line: 1 }]);
		expect(await previewTemplate(as('editor'), 'no-such', '')).toMatchObject({ reason: 'not_found' });
	});

	it('refuse a checklist that cannot be read, naming the line', () => {
		const parsed = templateEdit.safeParse({ ...text({ checklist: 'data: fine\nnonsense' }), version: 0 });
		expect(parsed.error?.issues.map(({ path, message }) => [path[0], message.slice(0, 30)])).toEqual([
			['checklist', 'Line 2 does not say what it is']
		]);
	});
});

describe('the checklist of an article', () => {
	const item = { group: 'data' as const, item: 'Every cell the article shows is signed off.' };

	it('is ticked off by testers and editors, with who and when, and taken back', async () => {
		await writtenArticle(database.db, all.writer);
		expect(await checkItem(as('writer'), slug, { ...item, checked: 'yes' })).toMatchObject({
			reason: 'forbidden'
		});
		wanted(await checkItem(as('tester'), slug, { ...item, checked: 'yes' }));
		// Ticked again by somebody else, the first stands.
		wanted(await checkItem(as('editor'), slug, { ...item, checked: 'yes' }));
		const ticked = async () =>
			wanted(await readReview(as('editor'), slug)).checklist.flatMap((one) => one.ticked ?? []);
		expect(await ticked()).toMatchObject([{ checkedBy: all.tester.name, checkedAt: as('tester').now }]);
		wanted(await checkItem(as('editor'), slug, { ...item, checked: 'no' }));
		expect(await ticked()).toEqual([]);
		const acts = (await database.db.select().from(auditEvent)).map(({ act }) => act);
		expect(acts.filter((act) => act.includes('check'))).toEqual(['article.check', 'article.uncheck']);
	});

	it('holds what its template holds, and nothing else', async () => {
		await writtenArticle(database.db, all.writer);
		expect(
			await checkItem(as('editor'), slug, { group: 'law', item: 'No such', checked: 'yes' })
		).toMatchObject({
			reason: 'not_found'
		});
	});
});

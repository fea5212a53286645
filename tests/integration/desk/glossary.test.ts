import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { ArticleData } from '../../../src/lib/domain/articles/data';
import { plainMove } from '../../../src/lib/schemas/article';
import { termEdit, termInput, termsQuery } from '../../../src/lib/schemas/glossary';
import * as editions from '../../../src/lib/server/db/queries/edition';
import { auditEvent } from '../../../src/lib/server/db/schema';
import { approveArticle } from '../../../src/lib/server/services/articles/approve-article';
import { openArticle } from '../../../src/lib/server/services/articles/open-article';
import { listTerms, showTerm } from '../../../src/lib/server/services/articles/read-glossary';
import { submitArticle } from '../../../src/lib/server/services/articles/submit-article';
import { createTerm, editTerm, retireTerm } from '../../../src/lib/server/services/articles/write-term';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { rowOf, slug, versionOf, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign, sourceOf } from './measured-campaign';

let database: TestDatabase;
let all: People;

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	all = await people(database.db);
});

const as = (who: keyof People) => contextFor(database.db, all[who]);
const boost = (more: object = {}) =>
	termInput.parse({
		term: 'boost',
		explanation: 'A clock above the rated one, while heat and power allow it.',
		aliases: 'turbo, boosting ',
		...more
	});
const listed = async (query: object = {}) =>
	wanted(await listTerms(as('writer'), termsQuery.parse(query))).rows;

describe('the glossary', () => {
	it('is written by writers and editors, and read by the desk', async () => {
		wanted(await createTerm(as('writer'), boost()));
		wanted(await createTerm(as('editor'), boost({ term: 'fabric clock', aliases: 'FCLK' })));
		for (const who of ['tester', 'liaison', 'admin'] as const)
			expect(await createTerm(as(who), boost({ term: 'other' }))).toMatchObject({ reason: 'forbidden' });
		expect(await listTerms(as('liaison'), termsQuery.parse({}))).toMatchObject({ reason: 'forbidden' });
		expect((await listed()).map(({ term, aliases }) => [term, aliases])).toEqual([
			['boost', ['turbo', 'boosting']],
			['fabric clock', ['FCLK']]
		]);
		expect((await listed({ q: 'FCLK' })).map(({ slug: name }) => name)).toEqual(['fabric-clock']);
	});

	it('has one term for a word, said beside the field, and refuses what cannot be set', async () => {
		wanted(await createTerm(as('writer'), boost()));
		expect(
			await createTerm(as('writer'), boost({ slug: 'other', term: 'Turbo', aliases: '' }))
		).toMatchObject({
			reason: 'conflict',
			fields: { term: [expect.stringContaining('“Turbo” is a word of the term “boost” already.')] }
		});
		expect(await createTerm(as('writer'), boost({ term: 'other', aliases: 'a, Boosting' }))).toMatchObject({
			fields: { aliases: [expect.stringContaining('boost')] }
		});
		expect(await createTerm(as('writer'), boost({ term: '時計', aliases: '' }))).toMatchObject({
			reason: 'invalid',
			fields: { slug: [expect.any(String)] }
		});
		expect(termInput.safeParse({ ...boost(), aliases: '', explanation: 'Short' }).success).toBe(false);
		expect((await listed()).length).toBe(1);
	});

	it('is changed over the version that was seen, with what it was in the log', async () => {
		wanted(await createTerm(as('writer'), boost()));
		const change = termEdit.parse({
			term: 'boost',
			explanation: 'A clock above the rated one.',
			aliases: '',
			version: 1
		});
		wanted(await editTerm(as('editor'), 'boost', change));
		expect(await editTerm(as('writer'), 'boost', change)).toMatchObject({ reason: 'conflict' });
		wanted(await retireTerm(as('writer'), 'boost', { retired: 'yes', version: 2 }));
		expect(await listed()).toEqual([]);
		expect(await listed({ state: 'retired' })).toHaveLength(1);
		expect(wanted(await showTerm(as('writer'), 'boost')).explanation).toBe('A clock above the rated one.');
		const events = await database.db.select().from(auditEvent);
		expect(events.map(({ act }) => act)).toEqual(['term.create', 'term.edit', 'term.retire']);
		expect(events[1]?.before).toMatchObject({ explanation: expect.stringContaining('while heat and power') });
	});

	it('is frozen with an edition: the terms it uses, as they were explained then', async () => {
		await measuredCampaign(database.db, all.tester);
		wanted(await createTerm(as('writer'), boost()));
		wanted(await createTerm(as('writer'), boost({ term: 'unused', aliases: '' })));
		await writtenArticle(database.db, all.writer, {
			source: `${sourceOf('aldermoor-1650-first-look')}\n\nIt does :term{name=turbo}.\n`
		});
		wanted(
			await submitArticle(
				as('writer'),
				slug,
				plainMove.parse({ version: await versionOf(database.db, slug) })
			)
		);
		wanted(
			await approveArticle(
				as('editor'),
				slug,
				plainMove.parse({ version: await versionOf(database.db, slug) })
			)
		);
		wanted(await retireTerm(as('writer'), 'boost', { retired: 'yes', version: 1 }));
		const row = await rowOf(database.db, slug);
		const edition = await editions.byId(database.db, row.approvedEditionId ?? 0);
		const data = JSON.parse(edition?.data ?? '{}') as ArticleData;
		expect(data.glossary?.map((one) => one.slug)).toEqual(['boost']);
		expect(edition?.page).toContain('while heat and power allow it.');
		expect(edition?.page).toContain('>turbo</a></dfn>');
		// A draft that names it says so, instead of leaving a gap.
		expect(wanted(await openArticle(as('writer'), slug)).html).toContain(
			'The glossary has no term called “turbo”'
		);
	});
});

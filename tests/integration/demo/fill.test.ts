import { asc, count, eq, isNotNull, isNull } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { preflight } from '../../../src/lib/domain/articles/preflight/all-checks';
import { renderArticle } from '../../../src/lib/domain/articles/render-article';
import type { ArticleData } from '../../../src/lib/domain/articles/data';
import {
	article,
	auditEvent,
	correction,
	edition,
	job,
	loan,
	mail,
	reading,
	run,
	user
} from '../../../src/lib/server/db/schema';
import { fillDemo } from '../../../src/lib/server/demo/fill';
import { testDatabase, type TestDatabase } from '../../support/database';

const now = new Date('2026-11-11T08:40:00Z');
const origin = 'https://northlight.example';
let database: TestDatabase;
let filled: boolean[];

beforeAll(async () => {
	database = await testDatabase();
	// Two processes that start together on one empty database.
	filled = await Promise.all([fillDemo(database.db, now, origin), fillDemo(database.db, now, origin)]);
}, 180_000);
afterAll(() => database.close());

const rows = async () => {
	const [[people], [events], [readings], [mails]] = await Promise.all([
		database.db.select({ n: count() }).from(user),
		database.db.select({ n: count() }).from(auditEvent),
		database.db.select({ n: count() }).from(reading),
		database.db.select({ n: count() }).from(mail)
	]);
	return { people: people?.n, events: events?.n, readings: readings?.n, mails: mails?.n };
};

describe('the demo', () => {
	it('is filled by one of two that start together', () => {
		expect([...filled].sort()).toEqual([false, true]);
	});

	it('has an article at every stage, three of them in print', async () => {
		const stages = await database.db.select({ slug: article.slug, stage: article.stage }).from(article);
		expect(Object.fromEntries(stages.map(({ slug, stage }) => [slug, stage]))).toEqual({
			'aldermoor-1650-four-ways-to-spend-sixteen-cores': 'published',
			'what-a-second-fan-buys': 'published',
			'pennon-6000-tested-one-line-in-a-menu': 'published',
			'brisk-360-quiet-at-what-price': 'scheduled',
			'marlow-g70-at-three-power-limits': 'approved',
			'memory-by-hand-what-an-evening-brings': 'in-review',
			'automatic-boost-and-nothing-else': 'changes-asked',
			'firmware-2-20-do-the-verdicts-stand': 'drafting',
			'what-idle-costs': 'withdrawn'
		});
	});

	it('prints nothing that preflight would have stopped', async () => {
		const printed = await database.db
			.select({ edition, stage: article.stage })
			.from(edition)
			.innerJoin(article, eq(article.id, edition.articleId))
			.where(isNotNull(edition.publishedAt));
		expect(printed.length).toBeGreaterThanOrEqual(5);
		for (const { edition: one } of printed) {
			const data = JSON.parse(one.data) as ArticleData;
			const findings = preflight({
				title: one.title,
				standfirst: one.standfirst,
				source: one.source,
				page: renderArticle(one.source, data, () => ''),
				data,
				blockingComments: [],
				printAt: one.publishedAt,
				now: one.approvedAt
			});
			expect(findings.filter((finding) => finding.severity === 'blocking')).toEqual([]);
		}
	});

	it('has a second edition with its correction, and a withdrawal with its reason', async () => {
		const told = await database.db
			.select({ kind: correction.kind, slug: article.slug, edition: edition.number })
			.from(correction)
			.innerJoin(article, eq(article.id, correction.articleId))
			.leftJoin(edition, eq(edition.id, correction.editionId))
			.orderBy(asc(correction.madeAt));
		expect(told.map(({ kind, slug, edition: number }) => [kind, slug.split('-')[0], number])).toEqual([
			['withdrawal', 'what', 1],
			['clarification', 'what', 1],
			['correction', 'aldermoor', 2]
		]);
	});

	it('says of the data what its figures say', async () => {
		const [guide] = await database.db
			.select({ data: edition.data })
			.from(edition)
			.innerJoin(article, eq(article.liveEditionId, edition.id))
			.where(eq(article.slug, 'aldermoor-1650-four-ways-to-spend-sixteen-cores'));
		const [campaign] = (JSON.parse(guide?.data ?? '{"campaigns":[]}') as ArticleData).campaigns;
		const verdict = (profile: string, workload: string) =>
			campaign?.cells.find((cell) => cell.profile === profile && cell.workload === workload)?.comparison
				?.verdict;
		expect(verdict('fixed-495', 'tile-render')).toBe('better');
		expect(verdict('fixed-495', 'prime-sieve')).toBe('worse');
		expect(verdict('switching-78', 'prime-sieve')).toBe('better');
		for (const profile of ['automatic-boost', 'fixed-470', 'fixed-495', 'switching-78'])
			expect(verdict(profile, 'frame-walk')).toBe('no-difference');
	});

	it('has runs voided and readings excluded, each with a reason, and loans at several stages', async () => {
		const voided = await database.db.select({ why: run.voidReason }).from(run).where(isNotNull(run.voidedAt));
		const excluded = await database.db
			.select({ why: reading.excludeReason })
			.from(reading)
			.where(isNotNull(reading.excludedAt));
		expect(voided).toHaveLength(1);
		expect(excluded).toHaveLength(2);
		for (const { why } of [...voided, ...excluded]) expect(why).toMatch(/\w{3}/);
		const stages = await database.db.selectDistinct({ stage: loan.stage }).from(loan);
		expect(stages.map(({ stage }) => stage).sort()).toEqual([
			'asked-for',
			'here',
			'in-transit',
			'kept',
			'returned'
		]);
	});

	it('leaves a handful of letters to send and the scheduled slot to come', async () => {
		const unsent = await database.db.select({ id: mail.id }).from(mail).where(isNull(mail.sentAt));
		const waiting = await database.db
			.select({ kind: job.kind, runAt: job.runAt })
			.from(job)
			.where(eq(job.state, 'waiting'));
		expect(unsent).toHaveLength(5);
		expect(waiting.filter(({ kind }) => kind === 'send-mail')).toHaveLength(5);
		const slots = waiting.filter(({ kind }) => kind !== 'send-mail');
		expect(slots.map(({ kind, runAt }) => [kind, runAt.toISOString()])).toEqual([
			['publish-article', '2026-11-13T15:00:00.000Z']
		]);
	});

	it('happened before now, in the order of the log', async () => {
		const events = await database.db
			.select({ at: auditEvent.at })
			.from(auditEvent)
			.orderBy(asc(auditEvent.id));
		const times = events.map(({ at }) => at.getTime());
		expect(times).toEqual([...times].sort((a, b) => a - b));
		expect(times.at(-1)).toBeLessThanOrEqual(now.getTime());
	});

	it('is filled once: a second call, and people who are there already, change nothing', async () => {
		const before = await rows();
		expect(await fillDemo(database.db, now, origin)).toBe(false);
		expect(await rows()).toEqual(before);
	});
});

import { sql } from 'drizzle-orm';
import {
	bigint,
	boolean,
	check,
	foreignKey,
	index,
	int,
	json,
	mysqlEnum,
	mysqlTable,
	primaryKey,
	text,
	uniqueIndex,
	varchar
} from 'drizzle-orm/mysql-core';
import { stages } from '../../../domain/articles/stage';
import { at, id, mediumtext, personId, sha256, slug, version } from '../columns';
import { campaign } from './campaign';
import { user } from './people';
import { part } from './stores';

export const correctionKinds = ['correction', 'clarification', 'update', 'withdrawal'] as const;

export const article = mysqlTable(
	'article',
	{
		id: id(),
		slug: slug(),
		title: varchar('title', { length: 200 }).notNull(),
		standfirst: varchar('standfirst', { length: 500 }).notNull().default(''),
		/** The template it began from, which also names what kind of article it is. */
		template: varchar('template', { length: 60 }).notNull(),
		stage: mysqlEnum('stage', stages).notNull(),
		authorId: personId('author_id')
			.notNull()
			.references(() => user.id),
		/** Number of the newest revision. */
		head: int('head').notNull().default(0),
		slotAt: at('slot_at'),
		/** The approved edition that waits to be printed; an edit takes it away. */
		approvedEditionId: int('approved_edition_id'),
		/** The edition readers see. */
		liveEditionId: int('live_edition_id'),
		firstPublishedAt: at('first_published_at'),
		withdrawnAt: at('withdrawn_at'),
		withdrawReason: text('withdraw_reason'),
		/** What readers will be told when the next edition of a printed article goes out; kept here until then. */
		nextCorrectionKind: mysqlEnum('next_correction_kind', correctionKinds),
		nextCorrectionBody: text('next_correction_body'),
		createdAt: at('created_at').notNull(),
		updatedAt: at('updated_at').notNull(),
		version: version()
	},
	(t) => [
		uniqueIndex('article_slug').on(t.slug),
		index('article_stage').on(t.stage, t.slotAt),
		index('article_author').on(t.authorId),
		index('article_updated').on(t.updatedAt),
		index('article_published').on(t.liveEditionId, t.firstPublishedAt),
		check(
			'article_slot',
			sql`${t.stage} <> 'scheduled' or (${t.slotAt} is not null and ${t.approvedEditionId} is not null)`
		),
		check('article_approved', sql`${t.stage} <> 'approved' or ${t.approvedEditionId} is not null`),
		check(
			'article_published',
			sql`${t.stage} <> 'published' or (${t.liveEditionId} is not null and ${t.firstPublishedAt} is not null)`
		),
		check('article_withdrawn', sql`(${t.withdrawnAt} is null) = (${t.withdrawReason} is null)`),
		check(
			'article_next_correction',
			sql`(${t.nextCorrectionKind} is null) = (${t.nextCorrectionBody} is null)`
		)
	]
);

export const articleCampaign = mysqlTable(
	'article_campaign',
	{
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		campaignId: int('campaign_id')
			.notNull()
			.references(() => campaign.id),
		position: int('position').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.articleId, t.campaignId] }),
		index('article_campaign_campaign').on(t.campaignId)
	]
);

/** Each save. */
export const revision = mysqlTable(
	'revision',
	{
		id: id(),
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		number: int('number').notNull(),
		title: varchar('title', { length: 200 }).notNull(),
		standfirst: varchar('standfirst', { length: 500 }).notNull(),
		source: mediumtext('source').notNull(),
		savedBy: personId('saved_by')
			.notNull()
			.references(() => user.id),
		savedAt: at('saved_at').notNull(),
		note: varchar('note', { length: 200 }).notNull().default(''),
		/** A name somebody gave it, to find it again; null for most. */
		label: varchar('label', { length: 80 }),
		/** Words against the revision before, counted when it was saved; null of those saved before there was a count. */
		wordsAdded: int('words_added'),
		wordsRemoved: int('words_removed')
	},
	(t) => [
		uniqueIndex('revision_number').on(t.articleId, t.number),
		index('revision_label').on(t.articleId, t.label)
	]
);

/** Who has an article open to edit it: a row each, raised by their browser now and then, old ones count for nothing. */
export const articlePresence = mysqlTable(
	'article_presence',
	{
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		personId: personId('person_id')
			.notNull()
			.references(() => user.id),
		/** Their last key in the text; null while they only look. */
		lastKeyAt: at('last_key_at'),
		seenAt: at('seen_at').notNull()
	},
	(t) => [primaryKey({ columns: [t.articleId, t.personId] }), index('article_presence_seen').on(t.seenAt)]
);

export const comment = mysqlTable(
	'comment',
	{
		id: id(),
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		revisionNumber: int('revision_number').notNull(),
		/** The passage it hangs on, as it read then; empty for the article as a whole. */
		quote: text('quote').notNull(),
		body: text('body').notNull(),
		blocking: boolean('blocking').notNull().default(false),
		authorId: personId('author_id')
			.notNull()
			.references(() => user.id),
		parentId: int('parent_id'),
		createdAt: at('created_at').notNull(),
		resolvedAt: at('resolved_at'),
		resolvedBy: personId('resolved_by').references(() => user.id)
	},
	(t) => [
		index('comment_article').on(t.articleId, t.id),
		index('comment_parent').on(t.parentId),
		foreignKey({ name: 'comment_thread', columns: [t.parentId], foreignColumns: [t.id] })
	]
);

/** What was approved: source, data and page frozen together. Rows are written once. */
export const edition = mysqlTable(
	'edition',
	{
		id: id(),
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		number: int('number').notNull(),
		revisionId: int('revision_id')
			.notNull()
			.references(() => revision.id),
		title: varchar('title', { length: 200 }).notNull(),
		standfirst: varchar('standfirst', { length: 500 }).notNull(),
		source: mediumtext('source').notNull(),
		/** Everything the page was drawn from (ArticleData as JSON). */
		data: mediumtext('data').notNull(),
		/** The finished page body, sanitised. */
		page: mediumtext('page').notNull(),
		/** Plain text for feeds and search. */
		plain: mediumtext('plain').notNull(),
		authorName: varchar('author_name', { length: 160 }).notNull(),
		testerNames: json('tester_names').$type<string[]>().notNull(),
		/** SHA-256 over source, data, page and plates. */
		hash: sha256('hash').notNull(),
		approvedBy: personId('approved_by')
			.notNull()
			.references(() => user.id),
		approvedAt: at('approved_at').notNull(),
		/** When this edition went out; null while it waits. */
		publishedAt: at('published_at')
	},
	(t) => [
		uniqueIndex('edition_number').on(t.articleId, t.number),
		index('edition_published').on(t.publishedAt)
	]
);

/** A chart or table of an edition, drawn once. */
export const plate = mysqlTable(
	'plate',
	{
		editionId: int('edition_id')
			.notNull()
			.references(() => edition.id),
		key: varchar('key', { length: 60 }).notNull(),
		kind: varchar('kind', { length: 30 }).notNull(),
		title: varchar('title', { length: 200 }).notNull(),
		svg: mediumtext('svg').notNull(),
		csv: mediumtext('csv').notNull()
	},
	(t) => [primaryKey({ columns: [t.editionId, t.key] })]
);

/** Which parts a published edition has results of. */
export const editionPart = mysqlTable(
	'edition_part',
	{
		editionId: int('edition_id')
			.notNull()
			.references(() => edition.id),
		partId: int('part_id')
			.notNull()
			.references(() => part.id)
	},
	(t) => [primaryKey({ columns: [t.editionId, t.partId] }), index('edition_part_part').on(t.partId)]
);

/** Figures as they were printed, for part and method pages: published data alone. */
export const editionResult = mysqlTable(
	'edition_result',
	{
		id: bigint('id', { mode: 'number', unsigned: true }).autoincrement().primaryKey(),
		editionId: int('edition_id')
			.notNull()
			.references(() => edition.id),
		campaignSlug: varchar('campaign_slug', { length: 80 }).notNull(),
		rigName: varchar('rig_name', { length: 160 }).notNull(),
		rigRevision: int('rig_revision').notNull(),
		profileSlug: varchar('profile_slug', { length: 80 }).notNull(),
		profileName: varchar('profile_name', { length: 160 }).notNull(),
		workloadSlug: varchar('workload_slug', { length: 80 }).notNull(),
		workloadName: varchar('workload_name', { length: 160 }).notNull(),
		unit: varchar('unit', { length: 40 }).notNull(),
		better: varchar('better', { length: 10 }).notNull(),
		/** The cell's summary and comparison as JSON, at full precision. */
		figures: json('figures').$type<unknown>().notNull()
	},
	(t) => [
		index('edition_result_edition').on(t.editionId),
		index('edition_result_workload').on(t.workloadSlug)
	]
);

/** What we put right after print: dated, worded, listed; never removed. */
export const correction = mysqlTable(
	'correction',
	{
		id: id(),
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		editionId: int('edition_id').references(() => edition.id),
		kind: mysqlEnum('kind', correctionKinds).notNull(),
		body: text('body').notNull(),
		madeBy: personId('made_by')
			.notNull()
			.references(() => user.id),
		madeAt: at('made_at').notNull()
	},
	(t) => [index('correction_article').on(t.articleId), index('correction_at').on(t.madeAt)]
);

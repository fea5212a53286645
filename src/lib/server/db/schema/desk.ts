import {
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
import { checklistGroups, type ChecklistItem } from '../../../domain/articles/template';
import { at, id, mediumtext, personId, slug, version } from '../columns';
import { article } from './articles';
import { user } from './people';

/** A word of the trade as the lab explains it to its readers, defined once. */
export const glossaryTerm = mysqlTable(
	'glossary_term',
	{
		id: id(),
		slug: slug(),
		term: varchar('term', { length: 120 }).notNull(),
		explanation: text('explanation').notNull(),
		/** Other words it goes by. */
		aliases: json('aliases').$type<string[]>().notNull(),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		updatedBy: personId('updated_by')
			.notNull()
			.references(() => user.id),
		updatedAt: at('updated_at').notNull(),
		/** No longer offered; editions that print it go on printing it. */
		retiredAt: at('retired_at'),
		version: version()
	},
	(t) => [
		uniqueIndex('glossary_term_slug').on(t.slug),
		uniqueIndex('glossary_term_term').on(t.term),
		index('glossary_term_list').on(t.retiredAt, t.term)
	]
);

/** A template that the lab has changed or made; those that ship are files until somebody changes them. */
export const articleTemplate = mysqlTable(
	'article_template',
	{
		id: id(),
		/** Its own name, which is also the kind of article it makes. */
		kind: slug(),
		/** The number of its newest revision. */
		head: int('head').notNull(),
		retiredAt: at('retired_at'),
		version: version()
	},
	(t) => [uniqueIndex('article_template_kind').on(t.kind)]
);

/** Each save of a template. */
export const templateRevision = mysqlTable(
	'template_revision',
	{
		id: id(),
		templateId: int('template_id')
			.notNull()
			.references(() => articleTemplate.id),
		number: int('number').notNull(),
		name: varchar('name', { length: 80 }).notNull(),
		title: varchar('title', { length: 200 }).notNull(),
		standfirst: varchar('standfirst', { length: 500 }).notNull(),
		purpose: varchar('purpose', { length: 300 }).notNull(),
		body: mediumtext('body').notNull(),
		checklist: json('checklist').$type<ChecklistItem[]>().notNull(),
		savedBy: personId('saved_by')
			.notNull()
			.references(() => user.id),
		savedAt: at('saved_at').notNull(),
		note: varchar('note', { length: 200 }).notNull().default('')
	},
	(t) => [uniqueIndex('template_revision_number').on(t.templateId, t.number)]
);

/** What somebody ticked off the checklist of an article; taken back, it goes and the audit log keeps it. */
export const articleCheck = mysqlTable(
	'article_check',
	{
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		group: mysqlEnum('group', checklistGroups).notNull(),
		item: varchar('item', { length: 200 }).notNull(),
		checkedBy: personId('checked_by')
			.notNull()
			.references(() => user.id),
		checkedAt: at('checked_at').notNull()
	},
	(t) => [primaryKey({ columns: [t.articleId, t.group, t.item] })]
);

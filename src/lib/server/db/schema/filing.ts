import { boolean, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { at, id, mediumtext, personId, version } from '../columns';
import { article } from './articles';
import { user } from './people';

/** A word an article is filed under. */
export const articleTag = mysqlTable(
	'article_tag',
	{
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		tag: varchar('tag', { length: 40 }).notNull()
	},
	(t) => [primaryKey({ columns: [t.articleId, t.tag] }), index('article_tag_tag').on(t.tag)]
);

/** The newest text of each article, for the search over drafts; its FULLTEXT index is written by hand in the migration. */
export const articleText = mysqlTable('article_text', {
	articleId: int('article_id')
		.primaryKey()
		.references(() => article.id),
	title: varchar('title', { length: 200 }).notNull(),
	standfirst: varchar('standfirst', { length: 500 }).notNull(),
	source: mediumtext('source').notNull()
});

/** Who handed an article of theirs on: still its author where nobody may judge an article of their own. */
export const articleHandOver = mysqlTable(
	'article_hand_over',
	{
		id: id(),
		articleId: int('article_id')
			.notNull()
			.references(() => article.id),
		fromId: personId('from_id')
			.notNull()
			.references(() => user.id),
		toId: personId('to_id')
			.notNull()
			.references(() => user.id),
		madeBy: personId('made_by')
			.notNull()
			.references(() => user.id),
		madeAt: at('made_at').notNull()
	},
	(t) => [index('article_hand_over_from').on(t.articleId, t.fromId)]
);

/** A filter of the article list that somebody kept under a name. */
export const deskView = mysqlTable(
	'desk_view',
	{
		id: id(),
		ownerId: personId('owner_id')
			.notNull()
			.references(() => user.id),
		name: varchar('name', { length: 60 }).notNull(),
		/** The list's address after the question mark. */
		query: varchar('query', { length: 1000 }).notNull(),
		/** Shown to everybody at the desk. */
		shared: boolean('shared').notNull().default(false),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [uniqueIndex('desk_view_name').on(t.ownerId, t.name), index('desk_view_shared').on(t.shared)]
);

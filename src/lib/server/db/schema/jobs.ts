import {
	bigint,
	index,
	int,
	json,
	mysqlEnum,
	mysqlTable,
	text,
	uniqueIndex,
	varchar
} from 'drizzle-orm/mysql-core';
import { at, mediumtext } from '../columns';

export const jobStates = ['waiting', 'done', 'dead', 'dropped'] as const;

export const job = mysqlTable(
	'job',
	{
		id: bigint('id', { mode: 'number', unsigned: true }).autoincrement().primaryKey(),
		kind: varchar('kind', { length: 60 }).notNull(),
		payload: json('payload').$type<Record<string, unknown>>().notNull(),
		/** The same key is queued once. */
		dedupeKey: varchar('dedupe_key', { length: 190 }),
		state: mysqlEnum('state', jobStates).notNull().default('waiting'),
		runAt: at('run_at').notNull(),
		attempts: int('attempts').notNull().default(0),
		maxAttempts: int('max_attempts').notNull().default(8),
		leasedUntil: at('leased_until'),
		leasedBy: varchar('leased_by', { length: 80 }),
		lastError: text('last_error'),
		createdAt: at('created_at').notNull(),
		finishedAt: at('finished_at')
	},
	(t) => [
		uniqueIndex('job_dedupe').on(t.dedupeKey),
		index('job_due').on(t.state, t.runAt),
		index('job_kind').on(t.kind, t.id)
	]
);

/** The e-mail outbox: written in the transaction of what it tells, sent by a job. */
export const mail = mysqlTable(
	'mail',
	{
		id: bigint('id', { mode: 'number', unsigned: true }).autoincrement().primaryKey(),
		/** Without the angle brackets; the same event makes the same id, so it is written once. */
		messageId: varchar('message_id', { length: 190 }).notNull(),
		recipient: varchar('recipient', { length: 254 }).notNull(),
		subject: varchar('subject', { length: 300 }).notNull(),
		textBody: mediumtext('text_body').notNull(),
		htmlBody: mediumtext('html_body').notNull(),
		createdAt: at('created_at').notNull(),
		sentAt: at('sent_at')
	},
	(t) => [uniqueIndex('mail_message_id').on(t.messageId), index('mail_unsent').on(t.sentAt, t.id)]
);

/** rate-limiter-flexible's own shape: attempts per account and per address. */
export const rateLimit = mysqlTable('rate_limit', {
	key: varchar('key', { length: 255 }).primaryKey(),
	points: int('points').notNull().default(0),
	expire: bigint('expire', { mode: 'number', unsigned: true })
});

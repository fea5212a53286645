import {
	bigint,
	boolean,
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
import { roles, type Role, type Scope } from '../../../domain/people/roles';
import { at, id, mediumtext, personId, sha256, version } from '../columns';

export const user = mysqlTable(
	'user',
	{
		id: personId('id').primaryKey(),
		name: varchar('name', { length: 160 }).notNull(),
		email: varchar('email', { length: 254 }).notNull(),
		emailVerified: at('email_verified'),
		image: varchar('image', { length: 500 }),
		/** argon2id, or none for a person who signs in by e-mailed link alone. */
		passwordHash: varchar('password_hash', { length: 255 }),
		/** Somebody who has left: keeps their name on what they did, cannot sign in. */
		leftAt: at('left_at'),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [uniqueIndex('user_email').on(t.email)]
);

export const userRole = mysqlTable(
	'user_role',
	{
		userId: personId('user_id')
			.notNull()
			.references(() => user.id),
		role: mysqlEnum('role', roles).notNull()
	},
	(t) => [primaryKey({ columns: [t.userId, t.role] }), index('user_role_role').on(t.role)]
);

/** The shapes of account, session and verification_token are those the Auth.js adapter expects. */
export const account = mysqlTable(
	'account',
	{
		userId: personId('user_id')
			.notNull()
			.references(() => user.id, { onDelete: 'cascade' }),
		type: varchar('type', { length: 40 }).notNull(),
		provider: varchar('provider', { length: 80 }).notNull(),
		providerAccountId: varchar('provider_account_id', { length: 190 }).notNull(),
		refresh_token: text('refresh_token'),
		access_token: text('access_token'),
		expires_at: int('expires_at'),
		token_type: varchar('token_type', { length: 40 }),
		scope: varchar('scope', { length: 255 }),
		id_token: text('id_token'),
		session_state: varchar('session_state', { length: 255 })
	},
	(t) => [primaryKey({ columns: [t.provider, t.providerAccountId] })]
);

export const session = mysqlTable(
	'session',
	{
		sessionToken: varchar('session_token', { length: 190 }).primaryKey(),
		userId: personId('user_id')
			.notNull()
			.references(() => user.id, { onDelete: 'cascade' }),
		expires: at('expires').notNull()
	},
	(t) => [index('session_user').on(t.userId)]
);

export const verificationToken = mysqlTable(
	'verification_token',
	{
		identifier: varchar('identifier', { length: 254 }).notNull(),
		token: varchar('token', { length: 190 }).notNull(),
		expires: at('expires').notNull()
	},
	(t) => [primaryKey({ columns: [t.identifier, t.token] })]
);

export const invitation = mysqlTable(
	'invitation',
	{
		id: id(),
		email: varchar('email', { length: 254 }).notNull(),
		name: varchar('name', { length: 160 }).notNull(),
		roles: json('roles').$type<Role[]>().notNull(),
		tokenHash: sha256('token_hash').notNull(),
		invitedBy: personId('invited_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		expiresAt: at('expires_at').notNull(),
		acceptedAt: at('accepted_at'),
		revokedAt: at('revoked_at')
	},
	(t) => [uniqueIndex('invitation_token').on(t.tokenHash), index('invitation_email').on(t.email)]
);

export const apiToken = mysqlTable(
	'api_token',
	{
		id: id(),
		userId: personId('user_id')
			.notNull()
			.references(() => user.id),
		name: varchar('name', { length: 120 }).notNull(),
		tokenHash: sha256('token_hash').notNull(),
		scopes: json('scopes').$type<Scope[]>().notNull(),
		createdAt: at('created_at').notNull(),
		lastUsedAt: at('last_used_at'),
		expiresAt: at('expires_at'),
		revokedAt: at('revoked_at')
	},
	(t) => [uniqueIndex('api_token_hash').on(t.tokenHash), index('api_token_user').on(t.userId)]
);

export const idempotencyKey = mysqlTable(
	'idempotency_key',
	{
		userId: personId('user_id')
			.notNull()
			.references(() => user.id),
		key: varchar('key', { length: 190 }).notNull(),
		method: varchar('method', { length: 10 }).notNull(),
		path: varchar('path', { length: 500 }).notNull(),
		bodyHash: sha256('body_hash').notNull(),
		/** Null while the first request is still at work. */
		status: int('status'),
		body: mediumtext('body'),
		/** Where what it made is read, as the answer said. */
		location: varchar('location', { length: 500 }),
		createdAt: at('created_at').notNull()
	},
	(t) => [primaryKey({ columns: [t.userId, t.key] }), index('idempotency_created').on(t.createdAt)]
);

/** Append-only: who did what to which row, before and after. */
export const auditEvent = mysqlTable(
	'audit_event',
	{
		id: bigint('id', { mode: 'number', unsigned: true }).autoincrement().primaryKey(),
		at: at('at').notNull(),
		/** Null when the application itself acted (the schedule, the demo). */
		actorId: personId('actor_id').references(() => user.id),
		act: varchar('act', { length: 60 }).notNull(),
		subjectKind: varchar('subject_kind', { length: 40 }).notNull(),
		subjectId: varchar('subject_id', { length: 60 }).notNull(),
		before: json('before').$type<unknown>(),
		after: json('after').$type<unknown>(),
		reason: text('reason')
	},
	(t) => [
		index('audit_subject').on(t.subjectKind, t.subjectId, t.id),
		index('audit_at').on(t.at),
		index('audit_actor').on(t.actorId, t.id)
	]
);

export const setting = mysqlTable('setting', {
	key: varchar('key', { length: 60 }).primaryKey(),
	value: json('value').$type<unknown>().notNull(),
	isDemo: boolean('is_demo').notNull().default(false),
	version: version()
});

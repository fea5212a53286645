import { sql } from 'drizzle-orm';
import {
	bigint,
	check,
	date,
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
import { embargoFields, loanStages, partKinds, provenances } from '../../../domain/stores/words';
import { at, currency, id, personId, slug, version } from '../columns';
import { user } from './people';

/** One line of a part's specification, in the order the maker gives them. */
export interface SpecificationLine {
	name: string;
	value: string;
	unit?: string;
}

export const part = mysqlTable(
	'part',
	{
		id: id(),
		slug: slug(),
		kind: mysqlEnum('kind', partKinds).notNull(),
		maker: varchar('maker', { length: 120 }).notNull(),
		model: varchar('model', { length: 160 }).notNull(),
		specification: json('specification').$type<SpecificationLine[]>().notNull(),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [uniqueIndex('part_slug').on(t.slug), index('part_kind').on(t.kind, t.maker, t.model)]
);

/** A price seen on a date; the latest is the part's price, the earlier ones stay. */
export const partPrice = mysqlTable(
	'part_price',
	{
		id: id(),
		partId: int('part_id')
			.notNull()
			.references(() => part.id),
		amountMinor: bigint('amount_minor', { mode: 'number' }).notNull(),
		currency: currency().notNull(),
		observedOn: date('observed_on', { mode: 'string' }).notNull(),
		source: varchar('source', { length: 200 }).notNull().default(''),
		createdAt: at('created_at').notNull()
	},
	(t) => [
		index('part_price_latest').on(t.partId, t.observedOn),
		check('part_price_not_negative', sql`${t.amountMinor} >= 0`),
		check('part_price_currency', sql`${t.currency} regexp '^[A-Z]{3}$'`)
	]
);

export const sample = mysqlTable(
	'sample',
	{
		id: id(),
		slug: slug(),
		partId: int('part_id')
			.notNull()
			.references(() => part.id),
		serial: varchar('serial', { length: 120 }).notNull().default(''),
		provenance: mysqlEnum('provenance', provenances).notNull(),
		condition: varchar('condition', { length: 300 }).notNull().default(''),
		place: varchar('place', { length: 160 }).notNull().default(''),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [uniqueIndex('sample_slug').on(t.slug), index('sample_part').on(t.partId)]
);

export const partner = mysqlTable(
	'partner',
	{
		id: id(),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		contactName: varchar('contact_name', { length: 160 }).notNull().default(''),
		contactEmail: varchar('contact_email', { length: 254 }).notNull().default(''),
		notes: text('notes').notNull(),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [uniqueIndex('partner_slug').on(t.slug), index('partner_name').on(t.name)]
);

export const loan = mysqlTable(
	'loan',
	{
		id: id(),
		partnerId: int('partner_id')
			.notNull()
			.references(() => partner.id),
		stage: mysqlEnum('stage', loanStages).notNull(),
		askedOn: date('asked_on', { mode: 'string' }),
		receivedOn: date('received_on', { mode: 'string' }),
		dueOn: date('due_on', { mode: 'string' }),
		closedOn: date('closed_on', { mode: 'string' }),
		terms: text('terms').notNull(),
		/** Goes under every article that used one of the samples. */
		disclosure: text('disclosure').notNull(),
		valueMinor: bigint('value_minor', { mode: 'number' }),
		currency: currency(),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [
		index('loan_partner').on(t.partnerId),
		index('loan_due').on(t.stage, t.dueOn),
		check('loan_value_has_currency', sql`(${t.valueMinor} is null) = (${t.currency} is null)`),
		check(
			'loan_due_after_receipt',
			sql`${t.dueOn} is null or ${t.receivedOn} is null or ${t.dueOn} >= ${t.receivedOn}`
		)
	]
);

export const loanSample = mysqlTable(
	'loan_sample',
	{
		loanId: int('loan_id')
			.notNull()
			.references(() => loan.id),
		sampleId: int('sample_id')
			.notNull()
			.references(() => sample.id)
	},
	(t) => [primaryKey({ columns: [t.loanId, t.sampleId] }), index('loan_sample_sample').on(t.sampleId)]
);

export const embargo = mysqlTable(
	'embargo',
	{
		id: id(),
		sampleId: int('sample_id')
			.notNull()
			.references(() => sample.id),
		loanId: int('loan_id').references(() => loan.id),
		field: mysqlEnum('field', embargoFields).notNull(),
		until: at('until').notNull(),
		note: text('note').notNull(),
		liftedAt: at('lifted_at'),
		liftedBy: personId('lifted_by').references(() => user.id),
		liftReason: text('lift_reason'),
		createdAt: at('created_at').notNull()
	},
	(t) => [
		index('embargo_sample').on(t.sampleId, t.until),
		index('embargo_loan').on(t.loanId),
		check('embargo_lift_has_reason', sql`(${t.liftedAt} is null) = (${t.liftReason} is null)`)
	]
);

/** One row for each reminder that went out, so that none goes twice. */
export const loanReminder = mysqlTable(
	'loan_reminder',
	{
		loanId: int('loan_id')
			.notNull()
			.references(() => loan.id),
		/** Which reminder, such as before-14, due, late-7. */
		kind: varchar('kind', { length: 30 }).notNull(),
		dueOn: date('due_on', { mode: 'string' }).notNull(),
		sentAt: at('sent_at').notNull()
	},
	(t) => [primaryKey({ columns: [t.loanId, t.kind, t.dueOn] })]
);

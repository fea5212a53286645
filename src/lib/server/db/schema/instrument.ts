import { sql } from 'drizzle-orm';
import {
	check,
	date,
	decimal,
	double,
	index,
	mysqlTable,
	uniqueIndex,
	varchar
} from 'drizzle-orm/mysql-core';
import { at, id, slug, version } from '../columns';

/** What a figure is read from, with what its maker or its calibration says of its error. */
export const instrument = mysqlTable(
	'instrument',
	{
		id: id(),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		serial: varchar('serial', { length: 120 }).notNull().default(''),
		quantity: varchar('quantity', { length: 80 }).notNull(),
		unit: varchar('unit', { length: 40 }).notNull(),
		/** Limits of error: ± this share of the reading, plus ± this much in the unit. */
		accuracyPercent: decimal('accuracy_percent', { precision: 8, scale: 5, mode: 'number' }).notNull(),
		accuracyAbsolute: double('accuracy_absolute').notNull(),
		/** The last digit it shows, in the unit. */
		resolution: double('resolution').notNull(),
		calibratedOn: date('calibrated_on', { mode: 'string' }),
		calibrationDueOn: date('calibration_due_on', { mode: 'string' }),
		/** Where the accuracy is taken from: a certificate's number, the manual. */
		accuracySource: varchar('accuracy_source', { length: 200 }).notNull().default(''),
		createdAt: at('created_at').notNull(),
		retiredAt: at('retired_at'),
		version: version()
	},
	(t) => [
		uniqueIndex('instrument_slug').on(t.slug),
		index('instrument_list').on(t.retiredAt, t.name),
		check(
			'instrument_accuracy',
			sql`${t.accuracyPercent} >= 0 and ${t.accuracyAbsolute} >= 0 and ${t.resolution} >= 0`
		)
	]
);

import { sql } from 'drizzle-orm';
import {
	check,
	double,
	index,
	int,
	mysqlEnum,
	mysqlTable,
	primaryKey,
	text,
	uniqueIndex,
	varchar
} from 'drizzle-orm/mysql-core';
import { settingQuantities } from '../../../domain/bench/words';
import { partKinds } from '../../../domain/stores/words';
import { at, id, personId, slug, version } from '../columns';
import { workload } from './bench-plan';
import { user } from './people';

/** What a firmware family calls a setting, and what the setting means. */
export const firmwareMeaning = mysqlTable(
	'firmware_meaning',
	{
		id: id(),
		family: varchar('family', { length: 80 }).notNull(),
		setting: varchar('setting', { length: 160 }).notNull(),
		quantity: mysqlEnum('quantity', settingQuantities).notNull(),
		/** The chiplet or core group it is of; 0 where it is of all. */
		coreGroup: int('core_group').notNull().default(0),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [
		uniqueIndex('firmware_meaning_setting').on(t.family, t.setting),
		check('firmware_meaning_group', sql`${t.coreGroup} between 0 and 64`)
	]
);

/** The lab's own limits, over which a profile is warned of. Never the maker's permission. */
export const labLimit = mysqlTable(
	'lab_limit',
	{
		id: id(),
		quantity: mysqlEnum('quantity', settingQuantities).notNull(),
		partKind: mysqlEnum('part_kind', partKinds).notNull(),
		limit: double('limit').notNull(),
		unit: varchar('unit', { length: 20 }).notNull(),
		/** Why this much: the maker's data sheet, the lab's own experience. */
		source: varchar('source', { length: 300 }).notNull(),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [uniqueIndex('lab_limit_what').on(t.quantity, t.partKind)]
);

/** A standard set of workloads with their repeats, from which a campaign is planned. */
export const suite = mysqlTable(
	'suite',
	{
		id: id(),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		purpose: text('purpose').notNull(),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		archivedAt: at('archived_at'),
		version: version()
	},
	(t) => [uniqueIndex('suite_slug').on(t.slug), index('suite_list').on(t.archivedAt, t.name)]
);

export const suiteWorkload = mysqlTable(
	'suite_workload',
	{
		suiteId: int('suite_id')
			.notNull()
			.references(() => suite.id),
		workloadId: int('workload_id')
			.notNull()
			.references(() => workload.id),
		position: int('position').notNull(),
		repeats: int('repeats').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.suiteId, t.workloadId] }),
		index('suite_workload_workload').on(t.workloadId),
		check('suite_workload_repeats', sql`${t.repeats} between 1 and 1000`)
	]
);

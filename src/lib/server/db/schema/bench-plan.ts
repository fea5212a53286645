import { sql } from 'drizzle-orm';
import {
	check,
	decimal,
	foreignKey,
	index,
	int,
	mysqlEnum,
	mysqlTable,
	primaryKey,
	text,
	uniqueIndex,
	varchar
} from 'drizzle-orm/mysql-core';
import { directions, headlines, settingQuantities, workloadClasses } from '../../../domain/bench/words';
import { at, id, personId, slug, version } from '../columns';
import { user } from './people';
import { sample } from './stores';

export const workload = mysqlTable(
	'workload',
	{
		id: id(),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		programVersion: varchar('program_version', { length: 80 }).notNull().default(''),
		/** How it is run: command, preset, scene. */
		settings: text('settings').notNull(),
		/** What is measured, such as time or throughput. */
		quantity: varchar('quantity', { length: 80 }).notNull(),
		unit: varchar('unit', { length: 40 }).notNull(),
		better: mysqlEnum('better', directions).notNull(),
		class: mysqlEnum('class', workloadClasses).notNull(),
		warmUps: int('warm_ups').notNull().default(1),
		repeats: int('repeats').notNull().default(5),
		coolDownS: int('cool_down_s').notNull().default(0),
		/** Least difference that matters, in percent. */
		leastDifferencePercent: decimal('least_difference_percent', {
			precision: 6,
			scale: 3,
			mode: 'number'
		}).notNull(),
		headline: mysqlEnum('headline', headlines).notNull().default('mean'),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [
		uniqueIndex('workload_slug').on(t.slug),
		index('workload_class').on(t.class, t.name),
		check(
			'workload_protocol',
			sql`${t.warmUps} >= 0 and ${t.repeats} between 1 and 1000 and ${t.coolDownS} >= 0`
		),
		check(
			'workload_least_difference',
			sql`${t.leastDifferencePercent} > 0 and ${t.leastDifferencePercent} < 100`
		)
	]
);

export const rig = mysqlTable(
	'rig',
	{
		id: id(),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		/** By which the meanings of its settings are looked up, whatever the version. */
		firmwareFamily: varchar('firmware_family', { length: 80 }).notNull().default(''),
		createdAt: at('created_at').notNull(),
		version: version()
	},
	(t) => [uniqueIndex('rig_slug').on(t.slug)]
);

/** A rig as it stood; revised, never edited once measured. */
export const rigRevision = mysqlTable(
	'rig_revision',
	{
		id: id(),
		rigId: int('rig_id')
			.notNull()
			.references(() => rig.id),
		number: int('number').notNull(),
		firmware: varchar('firmware', { length: 160 }).notNull().default(''),
		driver: varchar('driver', { length: 160 }).notNull().default(''),
		os: varchar('os', { length: 160 }).notNull().default(''),
		/** What changed against the revision before, in words. */
		change: text('change').notNull(),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull()
	},
	(t) => [uniqueIndex('rig_revision_number').on(t.rigId, t.number)]
);

export const rigSample = mysqlTable(
	'rig_sample',
	{
		rigRevisionId: int('rig_revision_id')
			.notNull()
			.references(() => rigRevision.id),
		sampleId: int('sample_id')
			.notNull()
			.references(() => sample.id),
		position: int('position').notNull()
	},
	(t) => [primaryKey({ columns: [t.rigRevisionId, t.sampleId] }), index('rig_sample_sample').on(t.sampleId)]
);

/** A tree of settings for one rig; the root is called stock. */
export const profile = mysqlTable(
	'profile',
	{
		id: id(),
		rigId: int('rig_id')
			.notNull()
			.references(() => rig.id),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		parentId: int('parent_id'),
		notes: text('notes').notNull(),
		createdAt: at('created_at').notNull(),
		version: version(),
		/** Unique where set: a rig has one root. */
		rootOf: int('root_of').generatedAlwaysAs(sql`(case when parent_id is null then rig_id else null end)`, {
			mode: 'virtual'
		})
	},
	(t) => [
		uniqueIndex('profile_slug').on(t.rigId, t.slug),
		uniqueIndex('profile_root').on(t.rootOf),
		index('profile_parent').on(t.parentId),
		uniqueIndex('profile_in_rig').on(t.id, t.rigId),
		foreignKey({
			name: 'profile_parent_same_rig',
			columns: [t.parentId, t.rigId],
			foreignColumns: [t.id, t.rigId]
		})
	]
);

export const profileSetting = mysqlTable(
	'profile_setting',
	{
		id: id(),
		profileId: int('profile_id')
			.notNull()
			.references(() => profile.id),
		position: int('position').notNull(),
		/** Menus from the outermost in, separated by ' > '. */
		menuPath: varchar('menu_path', { length: 300 }).notNull(),
		setting: varchar('setting', { length: 160 }).notNull(),
		value: varchar('value', { length: 80 }).notNull(),
		unit: varchar('unit', { length: 20 }).notNull().default(''),
		quantity: mysqlEnum('quantity', settingQuantities).notNull().default('other'),
		note: varchar('note', { length: 500 }).notNull().default('')
	},
	(t) => [uniqueIndex('profile_setting_position').on(t.profileId, t.position)]
);

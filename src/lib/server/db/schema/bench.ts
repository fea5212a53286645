import { sql } from 'drizzle-orm';
import {
	bigint,
	check,
	decimal,
	double,
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
import {
	directions,
	headlines,
	runSources,
	settingQuantities,
	workloadClasses
} from '../../../domain/bench/words';
import { at, id, personId, slug, version } from '../columns';
import { instrument } from './instrument';
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

export const campaign = mysqlTable(
	'campaign',
	{
		id: id(),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		rigRevisionId: int('rig_revision_id')
			.notNull()
			.references(() => rigRevision.id),
		purpose: text('purpose').notNull(),
		dueAt: at('due_at'),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		archivedAt: at('archived_at'),
		version: version()
	},
	(t) => [
		uniqueIndex('campaign_slug').on(t.slug),
		index('campaign_list').on(t.archivedAt, t.createdAt),
		index('campaign_rig').on(t.rigRevisionId)
	]
);

export const campaignProfile = mysqlTable(
	'campaign_profile',
	{
		campaignId: int('campaign_id')
			.notNull()
			.references(() => campaign.id),
		profileId: int('profile_id')
			.notNull()
			.references(() => profile.id),
		position: int('position').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.campaignId, t.profileId] }),
		index('campaign_profile_profile').on(t.profileId)
	]
);

export const campaignWorkload = mysqlTable(
	'campaign_workload',
	{
		campaignId: int('campaign_id')
			.notNull()
			.references(() => campaign.id),
		workloadId: int('workload_id')
			.notNull()
			.references(() => workload.id),
		position: int('position').notNull(),
		/** Readings each cell of this column needs. */
		repeats: int('repeats').notNull(),
		/** What the figures are read from; null where the program itself counts them. */
		instrumentId: int('instrument_id').references(() => instrument.id)
	},
	(t) => [
		primaryKey({ columns: [t.campaignId, t.workloadId] }),
		index('campaign_workload_workload').on(t.workloadId),
		check('campaign_workload_repeats', sql`${t.repeats} between 1 and 1000`)
	]
);

/** A tester answers for a cell's data; a later change takes the signature away, with a reason. */
export const cellSignature = mysqlTable(
	'cell_signature',
	{
		id: id(),
		campaignId: int('campaign_id').notNull(),
		profileId: int('profile_id').notNull(),
		workloadId: int('workload_id').notNull(),
		signedBy: personId('signed_by')
			.notNull()
			.references(() => user.id),
		signedAt: at('signed_at').notNull(),
		removedAt: at('removed_at'),
		removedReason: varchar('removed_reason', { length: 300 }),
		/** Unique where set: a cell has at most one standing signature. */
		standing: varchar('standing', { length: 40 }).generatedAlwaysAs(
			sql`(case when removed_at is null then concat(campaign_id, '/', profile_id, '/', workload_id) else null end)`,
			{ mode: 'virtual' }
		)
	},
	(t) => [
		uniqueIndex('cell_signature_standing').on(t.standing),
		index('cell_signature_cell').on(t.campaignId, t.profileId, t.workloadId),
		foreignKey({
			name: 'cell_signature_profile',
			columns: [t.campaignId, t.profileId],
			foreignColumns: [campaignProfile.campaignId, campaignProfile.profileId]
		}),
		foreignKey({
			name: 'cell_signature_workload',
			columns: [t.campaignId, t.workloadId],
			foreignColumns: [campaignWorkload.campaignId, campaignWorkload.workloadId]
		}),
		check('cell_signature_removal', sql`(${t.removedAt} is null) = (${t.removedReason} is null)`)
	]
);

/** One cell filled once. Never deleted: voided with a reason. */
export const run = mysqlTable(
	'run',
	{
		id: bigint('id', { mode: 'number', unsigned: true }).autoincrement().primaryKey(),
		campaignId: int('campaign_id').notNull(),
		profileId: int('profile_id').notNull(),
		workloadId: int('workload_id').notNull(),
		testerId: personId('tester_id')
			.notNull()
			.references(() => user.id),
		source: mysqlEnum('source', runSources).notNull(),
		/** Given by the sender, so that the same run sent twice is taken once. */
		clientKey: varchar('client_key', { length: 80 }),
		startedAt: at('started_at').notNull(),
		ambientC: double('ambient_c'),
		notes: text('notes').notNull(),
		createdAt: at('created_at').notNull(),
		voidedAt: at('voided_at'),
		voidedBy: personId('voided_by').references(() => user.id),
		voidReason: varchar('void_reason', { length: 500 }),
		version: version()
	},
	(t) => [
		index('run_cell').on(t.campaignId, t.profileId, t.workloadId, t.id),
		index('run_workload').on(t.workloadId),
		index('run_tester').on(t.testerId, t.createdAt),
		uniqueIndex('run_client_key').on(t.testerId, t.clientKey),
		foreignKey({
			name: 'run_profile',
			columns: [t.campaignId, t.profileId],
			foreignColumns: [campaignProfile.campaignId, campaignProfile.profileId]
		}),
		foreignKey({
			name: 'run_workload_in_campaign',
			columns: [t.campaignId, t.workloadId],
			foreignColumns: [campaignWorkload.campaignId, campaignWorkload.workloadId]
		}),
		check('run_void_has_reason', sql`(${t.voidedAt} is null) = (${t.voidReason} is null)`),
		check('run_ambient', sql`${t.ambientC} is null or ${t.ambientC} between -60 and 100`)
	]
);

/** One measured value in the workload's unit. Never deleted: excluded with a reason. */
export const reading = mysqlTable(
	'reading',
	{
		id: bigint('id', { mode: 'number', unsigned: true }).autoincrement().primaryKey(),
		runId: bigint('run_id', { mode: 'number', unsigned: true })
			.notNull()
			.references(() => run.id),
		position: int('position').notNull(),
		value: double('value').notNull(),
		clientKey: varchar('client_key', { length: 80 }),
		createdAt: at('created_at').notNull(),
		excludedAt: at('excluded_at'),
		excludedBy: personId('excluded_by').references(() => user.id),
		excludeReason: varchar('exclude_reason', { length: 500 })
	},
	(t) => [
		uniqueIndex('reading_position').on(t.runId, t.position),
		uniqueIndex('reading_client_key').on(t.runId, t.clientKey),
		index('reading_counted').on(t.runId, t.excludedAt),
		check('reading_exclusion_has_reason', sql`(${t.excludedAt} is null) = (${t.excludeReason} is null)`)
	]
);

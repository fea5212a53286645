import { sql } from 'drizzle-orm';
import {
	bigint,
	check,
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
import { runSources } from '../../../domain/bench/words';
import { at, id, personId, slug, version } from '../columns';
import { profile, rigRevision, workload } from './bench-plan';
import { instrument } from './instrument';
import { user } from './people';

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

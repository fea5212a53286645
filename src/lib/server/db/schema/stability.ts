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
import { attemptOutcomes, stressKinds } from '../../../domain/bench/stability/words';
import { at, id, personId, slug, version } from '../columns';
import { profile, rigRevision, workload } from './bench-plan';
import { user } from './people';

const volts = (name: string) => decimal(name, { precision: 7, scale: 4, mode: 'number' });
const rowId = () => bigint('id', { mode: 'number', unsigned: true }).autoincrement().primaryKey();

/** Stability attempts over rising settings, on one rig as it stood, from one profile on. */
export const ladder = mysqlTable(
	'ladder',
	{
		id: id(),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		rigRevisionId: int('rig_revision_id')
			.notNull()
			.references(() => rigRevision.id),
		/** What holds beside the clock and the voltage that are tried. */
		profileId: int('profile_id')
			.notNull()
			.references(() => profile.id),
		purpose: text('purpose').notNull(),
		/** The board's own step. */
		stepMhz: int('step_mhz').notNull(),
		/** Beyond these nothing is proposed; whose limits they are is said. */
		limitClockMhz: int('limit_clock_mhz').notNull(),
		limitVolts: volts('limit_volts').notNull(),
		limitTempC: double('limit_temp_c').notNull(),
		limitSource: varchar('limit_source', { length: 200 }).notNull(),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		archivedAt: at('archived_at'),
		version: version()
	},
	(t) => [
		uniqueIndex('ladder_slug').on(t.slug),
		index('ladder_list').on(t.archivedAt, t.createdAt),
		check('ladder_step', sql`${t.stepMhz} between 1 and 1000`),
		check('ladder_limits', sql`${t.limitClockMhz} > 0 and ${t.limitVolts} > 0 and ${t.limitTempC} > 0`)
	]
);

/** The stresses a ladder is climbed under, and how long one must be held. */
export const ladderStress = mysqlTable(
	'ladder_stress',
	{
		ladderId: int('ladder_id')
			.notNull()
			.references(() => ladder.id),
		workloadId: int('workload_id')
			.notNull()
			.references(() => workload.id),
		kind: mysqlEnum('kind', stressKinds).notNull(),
		minutes: int('minutes').notNull(),
		position: int('position').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.ladderId, t.workloadId] }),
		check('ladder_stress_minutes', sql`${t.minutes} between 1 and 100000`)
	]
);

/** One try at a clock and a voltage under one stress. Never deleted: voided with a reason. */
export const attempt = mysqlTable(
	'attempt',
	{
		id: rowId(),
		ladderId: int('ladder_id').notNull(),
		workloadId: int('workload_id').notNull(),
		clockMhz: double('clock_mhz').notNull(),
		volts: volts('volts').notNull(),
		durationMin: double('duration_min').notNull(),
		outcome: mysqlEnum('outcome', attemptOutcomes).notNull(),
		/** What was seen when it failed, in words. */
		failure: varchar('failure', { length: 200 }).notNull().default(''),
		errors: int('errors').notNull().default(0),
		peakTempC: double('peak_temp_c'),
		packageW: double('package_w'),
		ambientC: double('ambient_c'),
		notes: varchar('notes', { length: 1000 }).notNull().default(''),
		testerId: personId('tester_id')
			.notNull()
			.references(() => user.id),
		/** Given by the sender, so that the same attempt sent twice is taken once. */
		clientKey: varchar('client_key', { length: 80 }),
		startedAt: at('started_at').notNull(),
		createdAt: at('created_at').notNull(),
		voidedAt: at('voided_at'),
		voidedBy: personId('voided_by').references(() => user.id),
		voidReason: varchar('void_reason', { length: 500 })
	},
	(t) => [
		index('attempt_ladder').on(t.ladderId, t.startedAt),
		uniqueIndex('attempt_client_key').on(t.testerId, t.clientKey),
		foreignKey({
			name: 'attempt_stress',
			columns: [t.ladderId, t.workloadId],
			foreignColumns: [ladderStress.ladderId, ladderStress.workloadId]
		}),
		check(
			'attempt_figures',
			sql`${t.clockMhz} > 0 and ${t.volts} > 0 and ${t.durationMin} >= 0 and ${t.errors} >= 0`
		),
		check('attempt_failure', sql`${t.outcome} <> 'failed' or ${t.failure} <> ''`),
		check('attempt_void_has_reason', sql`(${t.voidedAt} is null) = (${t.voidReason} is null)`)
	]
);

/** A sweep of load under automatic boost, to find where the board should change to a fixed clock. */
export const sweep = mysqlTable(
	'sweep',
	{
		id: id(),
		slug: slug(),
		name: varchar('name', { length: 160 }).notNull(),
		rigRevisionId: int('rig_revision_id')
			.notNull()
			.references(() => rigRevision.id),
		profileId: int('profile_id')
			.notNull()
			.references(() => profile.id),
		workloadId: int('workload_id')
			.notNull()
			.references(() => workload.id),
		purpose: text('purpose').notNull(),
		/** The fixed clock the board would change to. */
		wantedClockMhz: double('wanted_clock_mhz').notNull(),
		/** The step in which the board takes the current. */
		currentStepA: double('current_step_a').notNull(),
		createdBy: personId('created_by')
			.notNull()
			.references(() => user.id),
		createdAt: at('created_at').notNull(),
		archivedAt: at('archived_at'),
		version: version()
	},
	(t) => [
		uniqueIndex('sweep_slug').on(t.slug),
		index('sweep_list').on(t.archivedAt, t.createdAt),
		check('sweep_figures', sql`${t.wantedClockMhz} > 0 and ${t.currentStepA} > 0`)
	]
);

/** The sweep driven through once. Never deleted: voided with a reason. */
export const sweepPass = mysqlTable(
	'sweep_pass',
	{
		id: rowId(),
		sweepId: int('sweep_id')
			.notNull()
			.references(() => sweep.id),
		number: int('number').notNull(),
		testerId: personId('tester_id')
			.notNull()
			.references(() => user.id),
		clientKey: varchar('client_key', { length: 80 }),
		startedAt: at('started_at').notNull(),
		ambientC: double('ambient_c'),
		notes: varchar('notes', { length: 1000 }).notNull().default(''),
		createdAt: at('created_at').notNull(),
		voidedAt: at('voided_at'),
		voidedBy: personId('voided_by').references(() => user.id),
		voidReason: varchar('void_reason', { length: 500 })
	},
	(t) => [
		uniqueIndex('sweep_pass_number').on(t.sweepId, t.number),
		uniqueIndex('sweep_pass_client_key').on(t.testerId, t.clientKey),
		check('sweep_pass_void_has_reason', sql`(${t.voidedAt} is null) = (${t.voidReason} is null)`)
	]
);

export const sweepPoint = mysqlTable(
	'sweep_point',
	{
		passId: bigint('pass_id', { mode: 'number', unsigned: true })
			.notNull()
			.references(() => sweepPass.id),
		position: int('position').notNull(),
		threads: int('threads').notNull(),
		currentA: double('current_a').notNull(),
		clockMhz: double('clock_mhz').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.passId, t.position] }),
		check('sweep_point_figures', sql`${t.threads} > 0 and ${t.currentA} >= 0 and ${t.clockMhz} > 0`)
	]
);

import { readFileSync } from 'node:fs';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { Direction, WorkloadClass } from '../../../src/lib/domain/bench/words';
import type { Context } from '../../../src/lib/server/context';
import type { Db } from '../../../src/lib/server/db/client';
import { profile, rig, rigRevision, workload } from '../../../src/lib/server/db/schema';
import { planCampaign } from '../../../src/lib/server/services/bench/plan-campaign';

export const fixture = (name: string): string =>
	readFileSync(new URL(`../../fixtures/${name}`, import.meta.url), 'utf8');

/** A line of tests/fixtures/readings.csv. */
export interface FixtureReading {
	profile: string;
	workload: string;
	unit: string;
	better: Direction;
	class: WorkloadClass;
	repeat: number;
	value: number;
	startedAt: string;
}

/** The readings really measured, in the order of the file. */
export const fixtureReadings = (): FixtureReading[] =>
	fixture('readings.csv')
		.trim()
		.split(/\r?\n/)
		.slice(1)
		.map((line) => {
			const [profileSlug = '', work = '', unit = '', better, kind, repeat, value, startedAt = ''] =
				line.split(',');
			return {
				profile: profileSlug,
				workload: work,
				unit,
				better: better as Direction,
				class: kind as WorkloadClass,
				repeat: Number(repeat),
				value: Number(value),
				startedAt
			};
		});

async function idOf(query: { $returningId: () => PromiseLike<{ id: number }[]> }): Promise<number> {
	const [row] = await query.$returningId();
	if (!row) throw new Error('no id');
	return row.id;
}

/** Stocks a database with the rig, profiles and workloads of the fixture. */
export async function stockBench(db: Db, by: Actor, now: Date): Promise<void> {
	const rows = fixtureReadings();
	const rigId = await idOf(db.insert(rig).values({ slug: 'n-12', name: 'Rig N-12', createdAt: now }));
	await db
		.insert(rigRevision)
		.values({ rigId, number: 1, change: '', createdBy: by.id, createdAt: now, firmware: 'Hollin 2.14' });
	const stock = await idOf(
		db.insert(profile).values({ rigId, slug: 'stock', name: 'Stock', notes: '', createdAt: now })
	);
	const others = [...new Set(rows.map((row) => row.profile))].filter((slug) => slug !== 'stock');
	await db.insert(profile).values(
		others.map((slug) => ({
			rigId,
			slug,
			name: slug.replaceAll('-', ' '),
			parentId: stock,
			notes: '',
			createdAt: now
		}))
	);
	const workloads = new Map(rows.map((row) => [row.workload, row]));
	await db.insert(workload).values(
		[...workloads.values()].map((row) => ({
			slug: row.workload,
			name: row.workload.replaceAll('-', ' '),
			settings: '',
			quantity: 'measured',
			unit: row.unit,
			better: row.better,
			class: row.class,
			repeats: 7,
			leastDifferencePercent: 1,
			createdAt: now
		}))
	);
}

/** The fixture's whole campaign, planned and empty; its slug. */
export async function plannedCampaign(ctx: Context, name = 'First look'): Promise<string> {
	const rows = fixtureReadings();
	const planned = await planCampaign(ctx, {
		name,
		slug: '',
		rig: 'n-12',
		profiles: [...new Set(rows.map((row) => row.profile))],
		workloads: [...new Set(rows.map((row) => row.workload))].map((slug) => ({
			workload: slug,
			instrument: '',
			repeats: null
		})),
		purpose: '',
		dueOn: ''
	});
	if (!planned.ok) throw new Error(planned.message);
	return planned.value.slug;
}

/** The value of an outcome that must be one. */
export function valueOf<T>(outcome: { ok: true; value: T } | { ok: false; message: string }): T {
	if (!outcome.ok) throw new Error(`refused: ${outcome.message}`);
	return outcome.value;
}

/** What R gives for the fixture: cells, ratios and geometric means, from tests/fixtures/reference.txt. */
export function reference() {
	const lines = fixture('reference.txt').split('\n');
	const from = (head: string) => lines.findIndex((line) => line.startsWith(head)) + 1;
	const until = (start: number, head: string) => {
		const end = lines.findIndex((line, at) => at > start && line.startsWith(head));
		return lines.slice(start, end);
	};
	const cells = until(from('profile,workload,n'), 'profile,workload,ratio').map((line) => {
		const [profileSlug, work, ...numbers] = line.split(',');
		const [n, mean, median, sd, cv, low, high] = numbers.map(Number);
		return { key: `${profileSlug}/${work}`, n, mean, median, sd, cv, low, high };
	});
	const ratios = until(from('profile,workload,ratio'), 'profile,geometric').map((line) => {
		const [profileSlug, work, ratio] = line.split(',');
		return { key: `${profileSlug}/${work}`, ratio: Number(ratio) };
	});
	const overall = until(from('profile,geometric'), 'frames').map((line) => {
		const [profileSlug, ratio] = line.split(',');
		return { profile: profileSlug ?? '', ratio: Number(ratio) };
	});
	return { cells, ratios, overall };
}

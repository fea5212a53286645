import type { Actor } from '../../../src/lib/domain/people/roles';
import type { Provenance } from '../../../src/lib/domain/stores/words';
import type { Db } from '../../../src/lib/server/db/client';
import {
	campaign,
	campaignProfile,
	campaignWorkload,
	cellSignature,
	part,
	profile,
	profileSetting,
	reading,
	rig,
	rigRevision,
	rigSample,
	run,
	sample,
	workload
} from '../../../src/lib/server/db/schema';

const now = new Date('2026-11-01T08:00:00.000Z');
const first = <T extends { id: number }>([row]: T[]): number => {
	if (!row) throw new Error('Nothing was inserted.');
	return row.id;
};

/** Seconds of a tile render, invented: stock near 35.1, fixed near 31.2. */
const readings = {
	stock: [35.0, 35.2, 35.1, 35.3, 34.9],
	'fixed-495': [31.1, 31.3, 31.2, 31.2, 31.2]
} as const;

export interface MeasuredCampaign {
	campaignId: number;
	sampleId: number;
	workloadId: number;
	profiles: { stock: number; 'fixed-495': number };
	/** Ids of the runs, by profile. */
	runs: { stock: number; 'fixed-495': number };
}

export interface CampaignOptions {
	/** How the processor came to us. */
	provenance?: Provenance;
	signed?: boolean;
	/** Core voltage of the fixed profile over a stock of 1.17 V. */
	voltage?: string;
	slug?: string;
}

/** A campaign of one workload and two profiles on one rig, measured and, unless said otherwise, signed off. */
export async function measuredCampaign(
	db: Db,
	tester: Actor,
	{ provenance = 'bought', signed = true, voltage, slug = 'aldermoor-1650-first-look' }: CampaignOptions = {}
): Promise<MeasuredCampaign> {
	const partId = first(
		await db
			.insert(part)
			.values({
				slug: `part-${slug}`,
				kind: 'processor',
				maker: 'Aldermoor',
				model: '1650',
				specification: [],
				createdAt: now
			})
			.$returningId()
	);
	const sampleId = first(
		await db
			.insert(sample)
			.values({ slug: `sample-${slug}`, partId, provenance, createdAt: now })
			.$returningId()
	);
	const rigId = first(
		await db
			.insert(rig)
			.values({ slug: `rig-${slug}`, name: 'N-12', createdAt: now })
			.$returningId()
	);
	const rigRevisionId = first(
		await db
			.insert(rigRevision)
			.values({ rigId, number: 1, firmware: '2.14', change: '', createdBy: tester.id, createdAt: now })
			.$returningId()
	);
	await db.insert(rigSample).values({ rigRevisionId, sampleId, position: 0 });
	const stock = first(
		await db
			.insert(profile)
			.values({ rigId, slug: 'stock', name: 'Stock', notes: '', createdAt: now })
			.$returningId()
	);
	const fixed = first(
		await db
			.insert(profile)
			.values({ rigId, slug: 'fixed-495', name: 'Fixed 4.95', parentId: stock, notes: '', createdAt: now })
			.$returningId()
	);
	const setting = {
		menuPath: 'Tuning > Voltages',
		setting: 'Core voltage',
		unit: 'V',
		quantity: 'core-voltage' as const
	};
	await db
		.insert(profileSetting)
		.values([
			{ profileId: stock, position: 0, value: '1.17', ...setting },
			...(voltage ? [{ profileId: fixed, position: 0, value: voltage, ...setting }] : [])
		]);
	const workloadId = first(
		await db
			.insert(workload)
			.values({
				slug: `tile-render-${slug}`,
				name: 'Tile render',
				settings: '',
				quantity: 'time',
				unit: 's',
				better: 'lower',
				class: 'all-core',
				leastDifferencePercent: 1,
				createdAt: now
			})
			.$returningId()
	);
	const campaignId = first(
		await db
			.insert(campaign)
			.values({
				slug,
				name: 'Aldermoor 1650, first look',
				rigRevisionId,
				purpose: '',
				createdBy: tester.id,
				createdAt: now
			})
			.$returningId()
	);
	const profiles = { stock, 'fixed-495': fixed };
	await db.insert(campaignProfile).values([
		{ campaignId, profileId: stock, position: 0 },
		{ campaignId, profileId: fixed, position: 1 }
	]);
	await db.insert(campaignWorkload).values({ campaignId, workloadId, position: 0, repeats: 5 });
	const measure = async (name: keyof typeof readings) => {
		const profileId = profiles[name];
		const runId = first(
			await db
				.insert(run)
				.values({
					campaignId,
					profileId,
					workloadId,
					testerId: tester.id,
					source: 'grid',
					startedAt: now,
					notes: '',
					createdAt: now
				})
				.$returningId()
		);
		await db
			.insert(reading)
			.values(readings[name].map((value, position) => ({ runId, position, value, createdAt: now })));
		if (signed)
			await db
				.insert(cellSignature)
				.values({ campaignId, profileId, workloadId, signedBy: tester.id, signedAt: now });
		return runId;
	};
	const runs = { stock: await measure('stock'), 'fixed-495': await measure('fixed-495') };
	return { campaignId, sampleId, workloadId, profiles, runs };
}

/** A text that names the data of such a campaign. */
export const sourceOf = (slug = 'aldermoor-1650-first-look', more = ''): string =>
	`Held at 4.95 GHz it renders in :reading{workload=tile-render-${slug} profile=fixed-495}, which is :gain{workload=tile-render-${slug} profile=fixed-495}.\n\n::plate{kind=gains over=stock}\n${more}`;

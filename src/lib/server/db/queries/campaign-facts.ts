import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import type { Db } from '../client';
import {
	campaign,
	campaignProfile,
	campaignWorkload,
	instrument,
	part,
	partPrice,
	profile,
	profileSetting,
	rig,
	rigRevision,
	rigSample,
	sample,
	user,
	workload
} from '../schema';

/** Campaigns with the rig as it stood. */
const headsOf = (db: Db, campaignIds: number[]) =>
	db
		.select({
			id: campaign.id,
			slug: campaign.slug,
			name: campaign.name,
			purpose: campaign.purpose,
			dueAt: campaign.dueAt,
			createdAt: campaign.createdAt,
			createdBy: user.name,
			archivedAt: campaign.archivedAt,
			version: campaign.version,
			rigId: rig.id,
			rigSlug: rig.slug,
			rigName: rig.name,
			rigRevisionId: rigRevision.id,
			revision: rigRevision.number,
			firmware: rigRevision.firmware,
			driver: rigRevision.driver,
			os: rigRevision.os
		})
		.from(campaign)
		.innerJoin(rigRevision, eq(rigRevision.id, campaign.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.innerJoin(user, eq(user.id, campaign.createdBy))
		.where(inArray(campaign.id, campaignIds))
		.orderBy(asc(campaign.id));

/** Their workloads in the campaign's order, with the readings each cell needs. */
const workloadsOf = (db: Db, campaignIds: number[]) =>
	db
		.select({
			campaignId: campaignWorkload.campaignId,
			needed: campaignWorkload.repeats,
			id: workload.id,
			slug: workload.slug,
			name: workload.name,
			programVersion: workload.programVersion,
			settings: workload.settings,
			quantity: workload.quantity,
			unit: workload.unit,
			better: workload.better,
			class: workload.class,
			headline: workload.headline,
			leastDifferencePercent: workload.leastDifferencePercent,
			warmUps: workload.warmUps,
			repeats: workload.repeats,
			coolDownS: workload.coolDownS,
			/** Null where the program itself counts. */
			instrument: {
				name: instrument.name,
				unit: instrument.unit,
				accuracyPercent: instrument.accuracyPercent,
				accuracyAbsolute: instrument.accuracyAbsolute,
				resolution: instrument.resolution,
				calibratedOn: instrument.calibratedOn,
				calibrationDueOn: instrument.calibrationDueOn
			}
		})
		.from(campaignWorkload)
		.innerJoin(workload, eq(workload.id, campaignWorkload.workloadId))
		.leftJoin(instrument, eq(instrument.id, campaignWorkload.instrumentId))
		.where(inArray(campaignWorkload.campaignId, campaignIds))
		.orderBy(asc(campaignWorkload.campaignId), asc(campaignWorkload.position), asc(workload.id));

/** Their profiles in the campaign's order. */
const profilesOf = (db: Db, campaignIds: number[]) =>
	db
		.select({
			campaignId: campaignProfile.campaignId,
			id: profile.id,
			slug: profile.slug,
			name: profile.name,
			parentId: profile.parentId,
			notes: profile.notes
		})
		.from(campaignProfile)
		.innerJoin(profile, eq(profile.id, campaignProfile.profileId))
		.where(inArray(campaignProfile.campaignId, campaignIds))
		.orderBy(asc(campaignProfile.campaignId), asc(campaignProfile.position), asc(profile.id));

/** Every profile of some rigs: the chains from which a campaign's profiles inherit. */
const profilesOfRigs = (db: Db, rigIds: number[]) =>
	db
		.select({
			id: profile.id,
			rigId: profile.rigId,
			slug: profile.slug,
			name: profile.name,
			parentId: profile.parentId,
			notes: profile.notes
		})
		.from(profile)
		.where(inArray(profile.rigId, rigIds))
		.orderBy(asc(profile.id));

/** The settings that each profile of some rigs makes itself, in menu order. */
const settingsOfRigs = (db: Db, rigIds: number[]) =>
	db
		.select({
			rigId: profile.rigId,
			profileId: profileSetting.profileId,
			position: profileSetting.position,
			menuPath: profileSetting.menuPath,
			setting: profileSetting.setting,
			value: profileSetting.value,
			unit: profileSetting.unit,
			quantity: profileSetting.quantity,
			note: profileSetting.note
		})
		.from(profileSetting)
		.innerJoin(profile, eq(profile.id, profileSetting.profileId))
		.where(inArray(profile.rigId, rigIds))
		.orderBy(asc(profileSetting.profileId), asc(profileSetting.position));

/** The samples of rig revisions with their parts and the latest price of each; the price is null where none was seen. */
export function kitOf(db: Db, rigRevisionIds: number[]) {
	const ranked = db
		.select({
			partId: partPrice.partId,
			amountMinor: partPrice.amountMinor,
			currency: partPrice.currency,
			observedOn: partPrice.observedOn,
			rank: sql<number>`row_number() over (partition by ${partPrice.partId} order by ${partPrice.observedOn} desc, ${partPrice.id} desc)`.as(
				'price_rank'
			)
		})
		.from(partPrice)
		.where(
			inArray(
				partPrice.partId,
				db
					.select({ partId: sample.partId })
					.from(rigSample)
					.innerJoin(sample, eq(sample.id, rigSample.sampleId))
					.where(inArray(rigSample.rigRevisionId, rigRevisionIds))
			)
		)
		.as('ranked');
	return db
		.select({
			rigRevisionId: rigSample.rigRevisionId,
			sampleId: sample.id,
			sample: sample.slug,
			serial: sample.serial,
			provenance: sample.provenance,
			partId: part.id,
			part: part.slug,
			maker: part.maker,
			model: part.model,
			kind: part.kind,
			price: {
				amountMinor: ranked.amountMinor,
				currency: ranked.currency,
				observedOn: ranked.observedOn
			}
		})
		.from(rigSample)
		.innerJoin(sample, eq(sample.id, rigSample.sampleId))
		.innerJoin(part, eq(part.id, sample.partId))
		.leftJoin(ranked, and(eq(ranked.partId, part.id), eq(ranked.rank, 1)))
		.where(inArray(rigSample.rigRevisionId, rigRevisionIds))
		.orderBy(asc(rigSample.rigRevisionId), asc(rigSample.position), asc(sample.id));
}

export type CampaignHead = Awaited<ReturnType<typeof headsOf>>[number];
export type CampaignWorkloadRow = Awaited<ReturnType<typeof workloadsOf>>[number];
export type CampaignProfileRow = Awaited<ReturnType<typeof profilesOf>>[number];
export type RigProfileRow = Awaited<ReturnType<typeof profilesOfRigs>>[number];
export type RigSettingRow = Awaited<ReturnType<typeof settingsOfRigs>>[number];
export type KitRow = Awaited<ReturnType<typeof kitOf>>[number];

export interface CampaignPlan {
	head: CampaignHead;
	/** Both in the campaign's order. */
	workloads: CampaignWorkloadRow[];
	profiles: CampaignProfileRow[];
}

export interface CampaignFacts extends CampaignPlan {
	/** All profiles of the rig and the settings each makes itself, for the chains to stock. */
	rigProfiles: RigProfileRow[];
	rigSettings: RigSettingRow[];
	kit: KitRow[];
}

/** Rig, profiles and workloads of several campaigns, in the order of their ids: three queries however many. */
export async function plansOf(db: Db, campaignIds: number[]): Promise<CampaignPlan[]> {
	if (campaignIds.length === 0) return [];
	const [heads, workloads, profiles] = await Promise.all([
		headsOf(db, campaignIds),
		workloadsOf(db, campaignIds),
		profilesOf(db, campaignIds)
	]);
	return heads.map((head) => ({
		head,
		workloads: workloads.filter((row) => row.campaignId === head.id),
		profiles: profiles.filter((row) => row.campaignId === head.id)
	}));
}

/** All that an article may say of several campaigns but their readings: six queries however many. */
export async function forCampaigns(db: Db, campaignIds: number[]): Promise<CampaignFacts[]> {
	const plans = await plansOf(db, campaignIds);
	if (plans.length === 0) return [];
	const rigIds = [...new Set(plans.map(({ head }) => head.rigId))];
	const revisionIds = [...new Set(plans.map(({ head }) => head.rigRevisionId))];
	const [rigProfiles, rigSettings, kit] = await Promise.all([
		profilesOfRigs(db, rigIds),
		settingsOfRigs(db, rigIds),
		kitOf(db, revisionIds)
	]);
	return plans.map((plan) => ({
		...plan,
		rigProfiles: rigProfiles.filter((row) => row.rigId === plan.head.rigId),
		rigSettings: rigSettings.filter((row) => row.rigId === plan.head.rigId),
		kit: kit.filter((row) => row.rigRevisionId === plan.head.rigRevisionId)
	}));
}

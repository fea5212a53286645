import { building } from '$app/environment';
import { database } from '../app';
import * as live from '../db/queries/live';
import { LiveHub } from './hub';

type CampaignHub = LiveHub<live.CampaignEvent>;

// One for the process, also where development loads this module again.
const kept = globalThis as typeof globalThis & { calipressCampaignHub?: CampaignHub };

/** A hub over one database. */
export const hubOver = (db: Parameters<typeof live.idsAfter>[0], everyMs = 500): CampaignHub =>
	new LiveHub({ ids: (after) => live.idsAfter(db, after), events: (ids) => live.events(db, ids), everyMs });

/** What happens in the campaigns that anybody watches through this process. */
export function campaignHub(): CampaignHub {
	if (building) throw new Error('Nobody watches while building.');
	return (kept.calipressCampaignHub ??= hubOver(database().db));
}

/** Ends all watches of this process. */
export const endWatches = async (): Promise<void> => kept.calipressCampaignHub?.stop();

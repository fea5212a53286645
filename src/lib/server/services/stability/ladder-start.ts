import type { LadderStart } from '../../../domain/bench/stability/ladder-report';
import { chainTo } from '../../../domain/bench/profile';
import { coreClocks } from '../../../domain/bench/tuning/core-facts';
import { meantSettings } from '../../../domain/bench/tuning/lab-reading';
import { valuesOf } from '../../../domain/bench/tuning/setting-values';
import type { Db } from '../../db/client';
import * as knowledge from '../../db/queries/lab-knowledge';
import * as profiles from '../../db/queries/profile';

/** Where a ladder begins: the lowest core clock and voltage that its profile sets; null where it sets none. */
export async function ladderStart(
	db: Db,
	{ rigId, profileId }: { rigId: number; profileId: number }
): Promise<LadderStart | null> {
	const chain = chainTo(await profiles.ofRigs(db, [rigId]), profileId);
	const [settings, labOf] = await Promise.all([
		profiles.settingsOf(
			db,
			chain.map((one) => one.id)
		),
		knowledge.ofRigs(db, [rigId])
	]);
	const effective = meantSettings(
		chain.map((one) => ({ settings: settings.filter((setting) => setting.profileId === one.id) })),
		labOf(rigId)
	);
	const clocks = coreClocks(effective).map((clock) => clock.mhz);
	const volts = valuesOf(effective, 'core-voltage').map((voltage) => voltage.value);
	return clocks.length > 0 && volts.length > 0
		? { clockMHz: Math.min(...clocks), volts: Math.min(...volts) }
		: null;
}

import type { PartKind } from '../../stores/words';
import type { Advice } from './advice';
import { limitAdvice, type LabLimit } from './limit-advice';
import { boostAdvice, twiceAdvice, unitAdvice } from './reading-advice';
import type { GroupedSetting } from './setting-values';
import { stepAdvice } from './step-advice';
import { timingAdvice } from './timing-advice';

/**
 * What a tester may want to look at again in a profile, warnings first. An empty list says that none of these rules
 * found anything, never that the settings are safe: the limits of the part's maker hold.
 * @param settings with their meanings put in (`meant`) where the lab has a mapping for the firmware
 * @param limits the lab's own limits table
 * @param kinds kinds of the parts in the rig; left out, limits of every kind apply
 */
export function consistency(
	settings: readonly GroupedSetting[],
	limits: readonly LabLimit[] = [],
	kinds?: readonly PartKind[]
): Advice[] {
	return [
		...limitAdvice(settings, limits, kinds),
		...stepAdvice(settings),
		...timingAdvice(settings),
		...boostAdvice(settings),
		...twiceAdvice(settings),
		...unitAdvice(settings)
	].sort((a, b) => Number(b.severity === 'warning') - Number(a.severity === 'warning'));
}

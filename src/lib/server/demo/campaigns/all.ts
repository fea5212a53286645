import type { Act, World } from '../act';
import { idle, idleArchived, loopFans, towerFans } from './cooling';
import { powerLimits } from './graphics';
import { measured } from './measured';
import { memoryMended, memoryRates } from './memory';
import { eightCores, fourWays, newFirmware } from './processor';

/** Every campaign of the demo, from planned to put away. */
export const campaigns = (world: World): Act[] => [
	...[towerFans, idle, fourWays, loopFans, memoryRates, powerLimits, newFirmware, eightCores].flatMap(
		(campaign) => measured(world, campaign)
	),
	...memoryMended(world),
	idleArchived(world)
];

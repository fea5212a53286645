import type { Act, World } from '../act';
import { idle, idleArchived, loopFans, towerFans } from './cooling';
import { powerLimits } from './graphics';
import { measured } from './measured';
import { memoryMended, memoryRates } from './memory';
import { costs } from './costs';
import { eightCores, fourWays, newFirmware } from './processor';
import { stockAgain } from './stock-again';

/** Every campaign of the demo, from planned to put away. */
export const campaigns = (world: World): Act[] => [
	...[towerFans, idle, fourWays, costs, loopFans, memoryRates, powerLimits, newFirmware, eightCores].flatMap(
		(campaign) => measured(world, campaign)
	),
	...stockAgain(world),
	...memoryMended(world),
	idleArchived(world)
];

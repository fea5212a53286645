import type { DerivedFact } from '../../articles/data';
import { coreFacts } from './core-facts';
import { memoryFacts, ratioFacts, rowCycleFacts } from './memory-facts';
import { powerFacts } from './power-facts';
import type { GroupedSetting } from './setting-values';

/**
 * What follows from a profile's settings by arithmetic, ready to print with its formula. What cannot be told
 * (a word for a value, a unit that is missing, a quantity set in several places) is left out, never guessed.
 * @param settings with their meanings put in (`meant`) where the lab has a mapping for the firmware
 */
export const derivedFacts = (settings: readonly GroupedSetting[]): DerivedFact[] => [
	...coreFacts(settings),
	...memoryFacts(settings),
	...rowCycleFacts(settings),
	...ratioFacts(settings),
	...powerFacts(settings)
];

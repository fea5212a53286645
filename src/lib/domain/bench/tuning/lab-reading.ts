import type { DerivedFact } from '../../articles/data';
import type { PartKind } from '../../stores/words';
import { effectiveSettings, type OwnSetting } from '../profile';
import type { Advice } from './advice';
import { consistency } from './consistency';
import { derivedFacts } from './derive';
import type { LabLimit } from './limit-advice';
import { meaningOf, meant, type MeaningEntry, type MeantSetting } from './meaning';

/** What the lab knows of a rig, by which the settings of its profiles are read. */
export interface LabKnowledge {
	/** The firmware family of the rig; empty where it is of none. */
	family: string;
	/** What settings of the family set. */
	meanings: MeaningEntry[];
	/** The lab's own limits. */
	limits: LabLimit[];
	/** Kinds of the parts in the rig as it stands now. */
	kinds: PartKind[];
}

/** A profile as the lab reads it; the same wherever it is shown. */
export interface ProfileReading {
	/** All settings that hold under it, in menu order, with what they set by the row or by the lab's meanings. */
	settings: MeantSetting[];
	derived: DerivedFact[];
	advice: Advice[];
}

type Chain = readonly { settings: readonly OwnSetting[] }[];

/**
 * All settings that hold under a profile, with the lab's meanings put in.
 * @param chain settings each profile makes itself, stock first, the profile itself last
 */
export const meantSettings = (
	chain: Chain,
	{ family, meanings }: Pick<LabKnowledge, 'family' | 'meanings'>
): MeantSetting[] => meant(effectiveSettings(chain), family, meanings);

/**
 * What a profile sets, what follows from it and what is worth another look: the one way to all three, for pages,
 * articles and the API.
 * @param chain settings each profile makes itself, stock first, the profile itself last
 */
export function profileReading(chain: Chain, lab: LabKnowledge): ProfileReading {
	const settings = meantSettings(chain, lab);
	return {
		settings,
		derived: derivedFacts(settings),
		advice: consistency(settings, lab.limits, lab.kinds)
	};
}

/**
 * Names of the settings that neither their rows nor the lab's meanings explain, each once; also where the rig names no
 * family yet.
 */
export const unexplained = (
	settings: readonly Pick<OwnSetting, 'menuPath' | 'setting' | 'quantity'>[],
	{ family, meanings }: Pick<LabKnowledge, 'family' | 'meanings'>
): string[] => [
	...new Set(
		settings.filter((row) => meaningOf(row, family, meanings).known === 'unknown').map((row) => row.setting)
	)
];

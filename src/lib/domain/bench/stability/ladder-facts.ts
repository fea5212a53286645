import type { Attempt } from './attempt';
import type { Limits } from './next-attempt';
import type { Demands } from './verdict';
import type { StressKind } from './words';

/** One of the loads a ladder is climbed under. */
export interface LadderStress {
	slug: string;
	name: string;
	kind: StressKind;
	/** Minutes without failure that count as a pass. */
	minutes: number;
}

/** A ladder with the attempts that stand: plain data, for screens and for articles. */
export interface LadderFacts {
	slug: string;
	name: string;
	rig: { slug: string; name: string; revision: number };
	profile: { slug: string; name: string };
	stepMHz: number;
	limits: Limits;
	stresses: LadderStress[];
	/** The oldest first. */
	attempts: Attempt[];
}

/** The minutes each stress of a ladder demands. */
export const demandsOf = ({ stresses }: Pick<LadderFacts, 'stresses'>): Demands =>
	Object.fromEntries(stresses.map(({ slug, minutes }) => [slug, minutes]));

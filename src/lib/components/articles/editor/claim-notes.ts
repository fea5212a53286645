import type { Claim, ClaimState } from '../../../domain/articles/claims/claims';
import type { PlacedClaim } from './claim-marks';

/** A note in the margin, where it wants to be and where there is room. */
export interface Note extends PlacedClaim {
	at: number;
}

/** Gap between two notes, in pixels. */
const gap = 10;

/**
 * Where notes go: beside their line, and below the one before where that is in the way.
 * @param heights of the notes, in the same order
 */
export function placeNotes(placed: readonly PlacedClaim[], heights: readonly (number | undefined)[]): Note[] {
	let free = 0;
	return placed.map((one, index) => {
		const at = Math.max(one.top, free);
		free = at + (heights[index] ?? 48) + gap;
		return { ...one, at };
	});
}

const counted: [ClaimState, string, string][] = [
	['contradicts', 'contradicts', 'contradict'],
	['more-than-data', 'says more than the data', 'say more than the data'],
	['not-backed', 'not backed', 'not backed']
];

/** How the claims stand, in few words. @example '1 contradicts, 5 not backed' */
export function claimsInWords(claims: readonly Pick<Claim, 'state'>[]): string {
	const parts = counted.flatMap(([state, one, several]) => {
		const count = claims.filter((claim) => claim.state === state).length;
		return count === 0 ? [] : [`${count} ${count === 1 ? one : several}`];
	});
	return parts.length > 0 ? parts.join(', ') : 'nothing against the data';
}

/** What needs somebody's eye, from a place in the text on, round to its beginning. */
export function nextToMend(claims: readonly Claim[], from: number): Claim | null {
	const open = claims.filter(({ state }) => state !== 'agrees' && state !== 'bound');
	return open.find((claim) => claim.from > from) ?? open[0] ?? null;
}

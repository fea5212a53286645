import { nearest } from '../shared/nearest';
import { kindOfWords, plainUnit, unitOf, unitsOf } from '../shared/units';

const quoted = (unit: string): string => `“${unit.trim().slice(0, 40)}”`;

/**
 * Says why a unit is not a workload's; null where it is. Three things go wrong and are told apart: a unit of the same
 * kind, which can be converted; a unit of another kind, which means the wrong column; and no unit at all.
 * @example unitFault('W', { slug: 'tile-render', unit: 's' }) // 'W is a power; tile-render is measured in s, a time. …'
 */
export function unitFault(sent: string, workload: { slug: string; unit: string }): string | null {
	const wanted = workload.unit;
	if (plainUnit(sent) === plainUnit(wanted)) return null;
	const [theirs, ours] = [unitOf(sent), unitOf(wanted)];
	if (theirs && ours?.kind === theirs.kind)
		return `${workload.slug} is measured in ${wanted}. ${sent.trim()} is the same kind: convert the readings and send them in ${wanted}.`;
	if (theirs) {
		const measured = ours ? `${wanted}, ${kindOfWords(ours.kind)}` : wanted;
		return `${sent.trim()} is ${kindOfWords(theirs.kind)}, but ${workload.slug} is measured in ${measured}. Send the readings of this workload, in ${wanted}.`;
	}
	if (sent.trim() === '') return `The unit is missing. ${workload.slug} is measured in ${wanted}.`;
	const near = nearest(sent, [...new Set([wanted, ...unitsOf(ours?.kind)])], 2);
	const meant = near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : '';
	return `${quoted(sent)} is no unit Calipress knows. ${workload.slug} is measured in ${wanted}.${meant}`;
}

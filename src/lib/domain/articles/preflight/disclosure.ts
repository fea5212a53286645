import { listed, type Check, type Finding } from './finding';

/** A sample that was lent, given or is from before production stands under the article in the words agreed for it. */
export const disclosure: Check = ({ data, page }) => {
	const owed = data.duties.filter((duty) => duty.provenance !== 'bought');
	if (owed.length === 0) return [];
	const findings: Finding[] = [];
	const names = (duties: typeof owed) =>
		listed(duties.map((duty) => `${duty.partName} (${duty.sample}, ${duty.provenance})`));
	if (!page.hasDisclosure)
		findings.push({
			check: 'disclosure',
			severity: 'blocking',
			message: `The article used ${names(owed)} and has no disclosure.`,
			mend: 'Put ::disclosure on a line of its own, where readers can’t miss it.',
			place: { kind: 'text' }
		});
	// What was given, or comes from before production, is named in plain words of our own; a loan has a partner's terms.
	const silent = owed.filter((duty) => duty.provenance === 'loaned' && (duty.disclosure ?? '').trim() === '');
	if (silent.length > 0)
		findings.push({
			check: 'disclosure',
			severity: 'blocking',
			message: `No disclosure text is agreed for ${names(silent)}.`,
			mend: 'The liaison writes it on the loan; the article picks it up from there.',
			place: { kind: 'text' }
		});
	return findings;
};

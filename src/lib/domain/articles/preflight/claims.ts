import type { Claim } from '../claims/claims';
import { claimsIn } from '../claims/claims';
import type { Check, Finding, PreflightInput } from './finding';

const quoted = ({ text }: Claim): string => `“${text.replace(/\s+/g, ' ').slice(0, 60)}”`;

const bindWords = ({ bindings: [first] }: Claim): string =>
	first ? ` ${first.source} prints ${first.prints}.` : '';

const place = ({ line }: Claim): Finding['place'] => ({ kind: 'line', line });

const said = (claim: Claim): string => [claim.stored, claim.why].filter(Boolean).join(' ');

const found = new WeakMap<PreflightInput, Claim[]>();

/** The claims of the text, found once for all the checks that ask. */
function claimsOf(input: PreflightInput): Claim[] {
	const known = found.get(input) ?? claimsIn(input.source, input.data);
	found.set(input, known);
	return known;
}

/** No number contradicts the data. */
export const contradictions: Check = (input) =>
	claimsOf(input)
		.filter((claim) => claim.kind === 'number' && claim.state === 'contradicts')
		.map((claim) => ({
			check: 'contradictions',
			severity: 'blocking',
			message: `Line ${claim.line}: ${quoted(claim)} contradicts the bench. ${said(claim)}`,
			mend: `Write the stored value, or bind it.${bindWords(claim)}`,
			place: place(claim)
		}));

/** Words such as “faster” say no more than the verdicts do. */
export const overstatements: Check = (input) =>
	claimsOf(input)
		.filter(
			(claim) =>
				claim.state === 'more-than-data' || (claim.kind === 'direction' && claim.state === 'contradicts')
		)
		.map((claim) => ({
			check: 'overstatements',
			severity: 'advice',
			message: `Line ${claim.line}: ${quoted(claim)} ${claim.state === 'contradicts' ? 'is not what the bench says' : 'says more than the data'}. ${said(claim)}`,
			mend: `Say what the verdict says.${bindWords(claim)}`,
			place: place(claim)
		}));

/** Numbers that nothing on the bench backs, counted, with the first few by name. */
export const unbackedNumbers: Check = (input) => {
	const claims = claimsOf(input).filter((claim) => claim.kind === 'number' && claim.state === 'not-backed');
	const [first] = claims;
	if (!first) return [];
	const shown = claims.slice(0, 5).map((claim) => `${quoted(claim)} (line ${claim.line})`);
	const more = claims.length > shown.length ? ` and ${claims.length - shown.length} more` : '';
	return [
		{
			check: 'unbacked-numbers',
			severity: 'advice',
			message: `${claims.length === 1 ? 'One number is' : `${claims.length} numbers are`} not backed by the data: ${shown.join(', ')}${more}.`,
			mend: 'Bind each to the bench, say in the text where it comes from, or take it out.',
			place: place(first)
		}
	];
};

import { caution } from './caution';
import { contradictions, overstatements, unbackedNumbers } from './claims';
import { comments } from './comments';
import { directives } from './directives';
import { disclosure } from './disclosure';
import { embargo } from './embargo';
import type { Check, Finding, PreflightInput } from './finding';
import { images } from './images';
import { labLimits } from './lab-limits';
import { readingsNeeded } from './readings-needed';
import { signOff } from './sign-off';
import { standfirst } from './standfirst';
import { titleLength } from './title-length';
import { wideIntervals } from './wide-intervals';

/** Every check, in the order an editor reads what they find. Add one here. */
export const allChecks: readonly Check[] = [
	directives,
	contradictions,
	signOff,
	embargo,
	disclosure,
	caution,
	images,
	comments,
	readingsNeeded,
	labLimits,
	wideIntervals,
	overstatements,
	unbackedNumbers,
	standfirst,
	titleLength
];

/**
 * The checks that are asked again of a frozen edition before it goes out: duties to partners and the editors' own
 * comments. The bench is not among them: what changes there after approval does not change the page.
 */
export const printChecks: readonly Check[] = [embargo, disclosure, comments];

/** The checks the schedule asks again at the slot: what the desk owes to others, whatever it decided itself. */
export const slotChecks: readonly Check[] = [embargo, disclosure];

/** What checks find, blocking findings first. */
export const preflight = (input: PreflightInput, checks: readonly Check[] = allChecks): Finding[] =>
	checks
		.flatMap((check) => check(input))
		.sort((a, b) => Number(b.severity === 'blocking') - Number(a.severity === 'blocking'));

/** The findings that stop approval and print. */
export const blocking = (findings: Finding[]): Finding[] =>
	findings.filter((finding) => finding.severity === 'blocking');

import { roundHalfUp } from '../../shared/round-half-up';

export interface RoundedResult {
	/** Plain digits with an ASCII point and minus. */
	value: string;
	uncertainty: string;
	/** Places behind the point; negative where tens or hundreds are rounded. */
	places: number;
}

/** Power of ten of the first significant digit. */
const exponentOf = (value: number): number => Number(value.toExponential().split('e')[1]);

/**
 * A value rounded to the place its uncertainty supports. The rule: two significant digits of the uncertainty (JCGM
 * 100:2008, 7.2.6 allows two at most; NIST GLP 9 keeps two), or with `short` one where its first digit is 3 or more,
 * so that rounding never moves it by more than a sixth (common practice, no source). The value goes to the same
 * place, halves away from zero, both from their own digits and once. RangeError for an uncertainty that is not above
 * zero, or figures that are not finite.
 * @example roundToUncertainty(10.05762, 0.027) // { value: '10.058', uncertainty: '0.027', places: 3 }
 */
export function roundToUncertainty(
	value: number,
	uncertainty: number,
	{ short = false }: { short?: boolean } = {}
): RoundedResult {
	if (!Number.isFinite(value)) throw new RangeError('Only a finite value can be rounded.');
	if (!(uncertainty > 0 && Number.isFinite(uncertainty))) {
		throw new RangeError('A value is rounded by an uncertainty above zero.');
	}
	const round = (of: number, places: number) => roundHalfUp(of.toExponential(), places);
	// Rounded to two digits before its place is read: 0.0996 is 0.10, so its second digit is the hundredth.
	const first = exponentOf(Number(round(uncertainty, 1 - exponentOf(uncertainty))));
	const two = 1 - first;
	const leading = Number(round(uncertainty, two)) / 10 ** first;
	const places = short && leading >= 3 ? two - 1 : two;
	return { value: round(value, places), uncertainty: round(uncertainty, places), places };
}

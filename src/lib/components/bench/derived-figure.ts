import type { DerivedFact } from '$lib/domain/articles/data';
import { printed, printedSigned, withUnit } from '$lib/domain/shared/quantity';

/** A derived fact as it is printed: its text where it has one, else its value with its unit. */
export const derivedFigure = ({ text, unit, value, decimals }: DerivedFact): string =>
	text ?? withUnit((unit === '%' ? printedSigned : printed)(value, { decimals }), unit);

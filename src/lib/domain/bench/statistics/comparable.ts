export interface Comparability {
	by: 'ratio' | 'difference';
	/** One sentence for the screen. */
	why: string;
}

const temperature = /^(°\s*[cf]|deg(ree)?s?\.?\s*[cf]|℃|℉|celsius|fahrenheit)$/;
const logarithmic = /^(db([\s(]|[acz]\b|m\b|v\b|i\b|fs\b|$)|decibels?\b|bels?$|np$|ph$)/;

/**
 * Whether two cells of a unit are held against each other by ratio or by difference, and why. A ratio needs a scale
 * with a true zero and means above it; °C and °F have an arbitrary zero, and decibels are ratios already.
 * @example comparable('°C', [71, 80]).by // 'difference'
 */
export function comparable(unit: string, means: readonly number[]): Comparability {
	const written = unit.trim().toLowerCase();
	if (temperature.test(written)) {
		return {
			by: 'difference',
			why: `${unit.trim()} has no true zero, so twice the figure is not twice as warm.`
		};
	}
	if (logarithmic.test(written)) {
		return { by: 'difference', why: `${unit.trim()} is a logarithm, so its differences are ratios already.` };
	}
	if (!means.every((mean) => mean > 0 && Number.isFinite(mean))) {
		return { by: 'difference', why: 'A mean is zero or below, where a ratio says nothing.' };
	}
	return { by: 'ratio', why: 'The unit starts at a true zero and every mean lies above it.' };
}

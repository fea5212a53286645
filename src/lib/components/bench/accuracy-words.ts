/** @example accuracyWords({ accuracyPercent: 0.1, accuracyAbsolute: 0.2, unit: 'W' }) // '± (0.1 % of the reading + 0.2 W)' */
export function accuracyWords(instrument: {
	accuracyPercent: number;
	accuracyAbsolute: number;
	unit: string;
}): string {
	const { accuracyPercent, accuracyAbsolute, unit } = instrument;
	const share = `${accuracyPercent} % of the reading`;
	const amount = `${accuracyAbsolute} ${unit}`;
	if (accuracyPercent > 0 && accuracyAbsolute > 0) return `± (${share} + ${amount})`;
	if (accuracyPercent > 0) return `± ${share}`;
	return accuracyAbsolute > 0 ? `± ${amount}` : 'not known';
}

const small =
	'zero one two three four five six seven eight nine ten eleven twelve thirteen fourteen fifteen sixteen seventeen eighteen nineteen twenty'.split(
		' '
	);
const tens = 'thirty forty fifty sixty seventy eighty ninety'.split(' ');

const values = new Map<string, number>([
	...small.map((word, value): [string, number] => [word, value]),
	...tens.map((word, index): [string, number] => [word, (index + 3) * 10]),
	['hundred', 100]
]);

const units = small.slice(1, 10).join('|');
/** Numbers spelled out: zero to twenty, the tens, and the tens with a unit behind them. */
export const spelled = `(?:(?:twenty|${tens.join('|')})[- ](?:${units})|a hundred|one hundred|${[...values.keys()].reverse().join('|')})`;

/** @example spelledValue('twenty-five') // 25 */
export function spelledValue(text: string): number {
	const words = text.toLowerCase().split(/[- ]/);
	if (words.includes('hundred')) return 100;
	return words.reduce((sum, word) => sum + (values.get(word) ?? 0), 0);
}

/** A number that is said by a word of its own. */
export interface WordRatio {
	/** What it multiplies by; for a part, the part. */
	value: number;
	/** Whether the word by itself says *times* (twice), or a part of something (a third). */
	kind: 'times' | 'part';
	/** Raises or lowers by itself, as a verb does. */
	verb: boolean;
}

const ofWord: [RegExp, WordRatio][] = [
	[/^twice$/i, { value: 2, kind: 'times', verb: false }],
	[/^thrice$/i, { value: 3, kind: 'times', verb: false }],
	[/^doubl(es|ed|ing)$/i, { value: 2, kind: 'times', verb: true }],
	[/^tripl(es|ed|ing)$/i, { value: 3, kind: 'times', verb: true }],
	[/^(quadrupl(es|ed|ing))$/i, { value: 4, kind: 'times', verb: true }],
	[/^double$/i, { value: 2, kind: 'times', verb: false }],
	[/^triple$/i, { value: 3, kind: 'times', verb: false }],
	[/^hal(ves|ved|ving)$/i, { value: 0.5, kind: 'times', verb: true }],
	[/^half$|^½$/i, { value: 1 / 2, kind: 'part', verb: false }],
	[/^(a|one) third$/i, { value: 1 / 3, kind: 'part', verb: false }],
	[/^two[- ]thirds$/i, { value: 2 / 3, kind: 'part', verb: false }],
	[/^(a|one) quarter$|^¼$/i, { value: 1 / 4, kind: 'part', verb: false }],
	[/^three[- ]quarters$/i, { value: 3 / 4, kind: 'part', verb: false }],
	[/^(a|one) fifth$/i, { value: 1 / 5, kind: 'part', verb: false }],
	[/^(a|one) tenth$/i, { value: 1 / 10, kind: 'part', verb: false }]
];

/** Words that are a ratio by themselves. */
export const ratioWords =
	'(?:twice|thrice|doubl(?:es|ed|ing|e)|tripl(?:es|ed|ing|e)|quadrupl(?:es|ed|ing)|hal(?:ves|ved|ving|f)|(?:a|one) (?:third|quarter|fifth|tenth)|two[- ]thirds|three[- ]quarters)';
/** As “tenfold”: a spelled number and *fold*. */
export const foldWords = `(?:two|three|four|five|six|seven|eight|nine|ten|twenty|hundred)-?fold`;

export function wordRatio(text: string): WordRatio | null {
	const fold = /^(.*?)-?fold$/i.exec(text);
	if (fold) return { value: spelledValue(fold[1] ?? ''), kind: 'times', verb: false };
	return ofWord.find(([pattern]) => pattern.test(text))?.[1] ?? null;
}

import { type Attempt, settingWords } from './attempt';
import { type Demands, verdictOf } from './verdict';

export interface Contradiction {
	passed: Attempt;
	failed: Attempt;
	words: string;
}

const atTime = (attempt: Attempt): number => Date.parse(attempt.at);

/** The fail that speaks loudest against a pass: of the lowest clock, and there of the highest voltage. */
const louder = (a: Attempt, b: Attempt): Attempt =>
	b.clockMHz < a.clockMHz || (b.clockMHz === a.clockMHz && b.volts > a.volts) ? b : a;

/**
 * Passes that cannot be squared with a fail of the same stress: passed at the same or a higher clock, with
 * the same or a lower voltage. One for each pass, against the fail that speaks loudest; short passes prove
 * nothing and contradict nothing. Something else differed then (heat, memory, luck): the words name it, a person
 * decides. Common practice, no source.
 */
export function contradictions(attempts: readonly Attempt[], demands: Demands): Contradiction[] {
	const fails = attempts.filter((one) => verdictOf(one, demands) === 'failed');
	return attempts.flatMap((passed) => {
		if (verdictOf(passed, demands) !== 'passed') return [];
		const against = fails.filter(
			(fail) =>
				fail.stress === passed.stress && fail.clockMHz <= passed.clockMHz && fail.volts >= passed.volts
		);
		const [first, ...others] = against;
		if (!first) return [];
		const failed = others.reduce(louder, first);
		const order = atTime(passed) < atTime(failed) ? 'before' : 'after';
		return [
			{ passed, failed, words: `passed ${settingWords(passed)} ${order} failing ${settingWords(failed)}` }
		];
	});
}

import { printed, withUnit } from '../../shared/quantity';
import { roundsTo } from './decimal';
import type { Figure } from './figures';
import { judged, type Judged } from './judged';
import { words, type Surroundings } from './scope';
import { senseOf } from './sense';

const percent = (value: number): string => withUnit(printed(value, { decimals: 1 }), '%');
const valueOf = (figure: Figure | undefined): number => figure?.readings[0]?.value ?? NaN;

/** Two numbers of one sentence with one unit, said as a change: “from 125 s to 100 s”. */
function pairOf(figures: readonly Figure[], figure: Figure, s: Surroundings): [Figure, Figure] | null {
	const others = figures.filter(
		(one) => one !== figure && one.from >= s.sentence.from && one.to <= s.sentence.to
	);
	for (let index = 0; index + 1 < others.length; index += 1) {
		const [one, two] = [others[index], others[index + 1]];
		if (!one || !two || JSON.stringify(one.quantity) !== JSON.stringify(two.quantity)) continue;
		const text = words(s.passage.text);
		const joined =
			/\b(?:from|went from)\s*$/i.test(text.slice(Math.max(0, one.from - 12), one.from)) &&
			/^\s*to\s*$/i.test(text.slice(one.to, two.from));
		if (joined) return [one, two];
	}
	return null;
}

/** What a sentence's own numbers say of each other, where it mixes up points and percent, or time and rate. */
export function textTrap(figure: Figure, figures: readonly Figure[], s: Surroundings): Judged | null {
	const [said] = figure.readings;
	if (!said || figure.quantity.kind !== 'percent' || figure.high) return null;
	const pair = pairOf(figures, figure, s);
	if (!pair) return null;
	const [before, after] = [valueOf(pair[0]), valueOf(pair[1])];
	if (!(before > 0) || !(after > 0)) return null;
	const change = (after / before - 1) * 100;
	const kind = pair[0].quantity.kind;
	if (kind === 'percent' && roundsTo(Math.abs(after - before), said) && !roundsTo(Math.abs(change), said)) {
		const why = `${percent(before)} to ${percent(after)} is ${printed(Math.abs(after - before))} percentage points, and ${percent(change)}.`;
		return judged('contradicts', null, why, 'points');
	}
	const { quantity } = pair[0];
	const isTime = quantity.kind === 'unit' && /^(?:s|ms|ns|μs|min|h)$/.test(quantity.unit);
	const sense = senseOf(words(s.passage.text), figure, s.clause);
	const rate = (before / after - 1) * 100;
	if (isTime && sense.of === 'rate' && roundsTo(Math.abs(change), said) && !roundsTo(Math.abs(rate), said)) {
		const why = `The time changes by ${percent(change)}; the rate, which is what “faster” says, by ${percent(rate)}.`;
		return judged('contradicts', null, why, 'wrong-way');
	}
	return null;
}

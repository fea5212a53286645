import { describe, expect, it } from 'vitest';
import { moved, sweep } from './sweep.fixture';
import { switchPoint } from './switch-point';
import { switchWords } from './switch-words';

const words = (passes: Parameters<typeof switchPoint>[0], wantedMHz = 5400) =>
	switchWords(switchPoint(passes, { wantedMHz, stepA: 1 }), wantedMHz).replaceAll('\u00a0', ' ');

describe('a switch point in words', () => {
	it('says where, how surely, what to set and why', () => {
		expect(words([moved(-1), sweep, moved(1)])).toBe(
			'Automatic boost falls under 5400 MHz at 163.3 A. With 95 % confidence it lies at 160.8 to 165.8 A (3 passes). Set the switch at 159 A or a little below. Too low gives up a little boost where it is hardly above 5400 MHz; too high leaves the part slower than 5400 MHz between the crossing and the switch. Below 159 A the board boosts by itself; from there on it holds 5400 MHz.'
		);
	});

	it('says that one pass gives no interval', () => {
		expect(words([sweep])).toContain('at 163.3 A. One pass gives no interval: repeat the sweep.');
	});

	it('says where the passes disagree', () => {
		expect(words([sweep, sweep.slice(0, 5)])).toContain('1 of 2 passes cross it, so there is no interval');
	});

	it('says what is not known', () => {
		expect(words([sweep], 5250)).toBe(
			'Automatic boost never falls under 5250 MHz, up to 180 A: no switch is called for in what was measured. Beyond it nothing is known.'
		);
		expect(words([sweep], 5501)).toContain('under 5501 MHz from the first point on, at 120 A');
	});

	it('advises nothing where the margin is as wide as the current', () => {
		expect(words([moved(-60), moved(60)])).toContain('repeat the sweep before you set a switch');
	});
});

import { expect, it } from 'vitest';
import { fact } from './setting-fact.fixture';
import { stepTotals } from './step-totals';
import { steps } from './steps';

it('counts steps, settings, changes, cautions and lines', () => {
	const list = steps([
		fact({ setting: 'Ratio', value: '52', stockValue: '47', note: 'First.' }),
		fact({ setting: 'Voltage', quantity: 'core-voltage', unit: 'V', value: '1.3', stockValue: '1.2' }),
		fact({ setting: 'Boost', value: 'On', stockValue: 'On' })
	]);
	// Two menus opened and left, three settings.
	expect(stepTotals(list)).toEqual({ steps: 7, settings: 3, changed: 2, cautions: 1, lines: 10 });
	expect(stepTotals([])).toEqual({ steps: 0, settings: 0, changed: 0, cautions: 0, lines: 0 });
});

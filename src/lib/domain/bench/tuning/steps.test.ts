import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fact } from './setting-fact.fixture';
import { steps } from './steps';

const inWords = (settings: Parameters<typeof steps>[0]) =>
	steps(settings).map((step) =>
		step.kind === 'set'
			? `${step.number} set ${step.setting}`
			: `${step.number} ${step.kind} ${step.path.join(' > ')}`
	);

describe('a profile as steps', () => {
	it('enters and leaves each menu', () => {
		expect(
			inWords([
				fact({ menuPath: 'Tuning > Clocks', setting: 'Core ratio' }),
				fact({ menuPath: 'Tuning > Clocks', setting: 'Reference clock' }),
				fact({ menuPath: 'Tuning > Memory > Timings', setting: 'CAS latency' }),
				fact({ menuPath: '', setting: 'Save' })
			])
		).toEqual([
			'1 open-menu Tuning',
			'2 open-menu Tuning > Clocks',
			'3 set Core ratio',
			'4 set Reference clock',
			'5 leave Tuning > Clocks',
			'6 open-menu Tuning > Memory',
			'7 open-menu Tuning > Memory > Timings',
			'8 set CAS latency',
			'9 leave Tuning > Memory > Timings',
			'10 leave Tuning > Memory',
			'11 leave Tuning',
			'12 set Save'
		]);
	});

	it('says what differs from stock and what needs care', () => {
		const [, , first, second] = steps([
			fact({
				setting: 'Core voltage',
				quantity: 'core-voltage',
				unit: 'V',
				value: '1.3',
				stockValue: '1.2',
				note: 'Wait.'
			}),
			fact({ setting: 'Boost', value: 'On', stockValue: 'On' })
		]);
		expect(first).toMatchObject({
			changed: true,
			stockValue: '1.2',
			note: 'Wait.',
			caution: { topic: 'voltage' }
		});
		expect(second).toMatchObject({ changed: false, caution: null });
	});

	it('leaves every menu it opened, and sets in the order given', () => {
		const menu = fc.array(fc.constantFrom('A', 'B', 'C'), { maxLength: 3 });
		fc.assert(
			fc.property(fc.array(menu, { maxLength: 8 }), (menus) => {
				const found = steps(
					menus.map((path, index) => fact({ menuPath: path.join(' > '), setting: String(index) }))
				);
				const open: string[] = [];
				const set: string[] = [];
				for (const step of found) {
					if (step.kind === 'set') {
						expect(open).toEqual(menus[set.length]);
						set.push(step.setting);
					} else if (step.kind === 'open-menu') {
						open.push(step.menu);
						expect(step.path).toEqual(open);
					} else {
						expect(step.path).toEqual(open);
						open.pop();
					}
				}
				expect(open).toEqual([]);
				expect(set).toEqual(menus.map((_, index) => String(index)));
				expect(found.map((step) => step.number)).toEqual(found.map((_, index) => index + 1));
			})
		);
	});
});

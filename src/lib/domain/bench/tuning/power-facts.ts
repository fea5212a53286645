import type { DerivedFact } from '../../articles/data';
import { coreClocks, type CoreClock } from './core-facts';
import { short } from './figures';
import { dynamicPowerFactor } from './power';
import { asIn, single, valuesOf, type GroupedSetting } from './setting-values';

/** The one core voltage; among several clocks, that of the clock's own group. Null where none can be told. */
function voltsOf(settings: readonly GroupedSetting[], clock: CoreClock, several: boolean): number | null {
	if (!several) return single(settings, 'core-voltage');
	const own = valuesOf(settings, 'core-voltage').filter(({ group }) => group === clock.group);
	return clock.group !== null && own.length === 1 ? (own[0]?.value ?? null) : null;
}

/** Estimated dynamic power of each core clock against stock; with several clocks, of those with a voltage of their own. */
export function powerFacts(settings: readonly GroupedSetting[]): DerivedFact[] {
	const before = asIn(settings, 'stockValue');
	const clocks = coreClocks(settings);
	const stockClocks = coreClocks(before);
	const several = clocks.length > 1 || stockClocks.length > 1;
	return clocks.flatMap((clock) => {
		const stockClock = several ? stockClocks.find(({ key }) => key === clock.key) : stockClocks[0];
		if (!stockClock) return [];
		const volts = voltsOf(settings, clock, several);
		const stockVolts = voltsOf(before, stockClock, several);
		if (volts === null || stockVolts === null) return [];
		if (volts === stockVolts && clock.mhz === stockClock.mhz) return [];
		return [
			{
				name: several ? `Estimated dynamic power, ${clock.label}` : 'Estimated dynamic power',
				value: dynamicPowerFactor({ volts, clock: clock.mhz }, { volts: stockVolts, clock: stockClock.mhz }),
				unit: '× stock',
				decimals: 2,
				how: `V² × f against stock, leakage left out: (${short(volts)} V ÷ ${short(stockVolts)} V)² × ${short(clock.mhz)} MHz ÷ ${short(stockClock.mhz)} MHz`
			}
		];
	});
}

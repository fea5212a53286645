import { describe, expect, it } from 'vitest';
import { cellUncertainty, type InstrumentFacts } from './cell-uncertainty';
import { summarise } from './statistics/summary';

const meter: InstrumentFacts = {
	name: 'Sallow W2',
	unit: 'W',
	accuracyPercent: 0,
	accuracyAbsolute: 0,
	resolution: 0,
	calibratedOn: '2026-01-12',
	calibrationDueOn: '2027-01-12'
};
const readings = [100.1, 100.3, 99.9, 100.2, 100];

describe('the uncertainty of a cell', () => {
	it('is s/√n with Student’s factor where the instrument adds nothing (JCGM 100:2008, 4.2.3 and table G.2: t 2.78 at 4)', () => {
		const found = cellUncertainty(summarise(readings), 'W', meter, '2026-11-11');
		expect(found?.u).toBeCloseTo(Math.sqrt(0.025 / 5), 12);
		expect(found?.df).toBeCloseTo(4, 10);
		expect(found?.k).toBeCloseTo(2.78, 2);
		expect(found?.typeB).toBe(0);
	});

	it('adds half width / √3 of the accuracy and δ / √12 of the display (JCGM 100:2008, 4.3.7 and F.2.2.1)', () => {
		const instrument = { ...meter, accuracyPercent: 0.5, accuracyAbsolute: 0.2, resolution: 0.1 };
		const found = cellUncertainty(summarise(readings), 'W', instrument, '2026-11-11');
		const [accuracy, display] = [(0.5 * 1.001 + 0.2) / Math.sqrt(3), 0.1 / Math.sqrt(12)];
		expect(found?.typeB).toBeCloseTo(Math.hypot(accuracy, display), 12);
		expect(found?.u).toBeCloseTo(Math.sqrt(0.005 + accuracy ** 2 + display ** 2), 12);
		// G.4.1: u⁴ / (uA⁴ / 4), cut to whole ones for k; far out it is the normal 1.96.
		expect(found?.df).toBeCloseTo((found?.u ?? 0) ** 4 / (0.005 ** 2 / 4), 6);
		expect(found?.k).toBeCloseTo(1.96, 1);
		expect(found?.printed).toEqual({ value: '100.10', uncertainty: '0.81', places: 2 });
	});

	it('says when the calibration had run out on the day', () => {
		const of = (day: string) => cellUncertainty(summarise(readings), 'W', meter, day);
		expect(of('2027-01-12')).toMatchObject({ overdue: false });
		expect(of('2027-01-13')).toMatchObject({
			overdue: true,
			calibration: 'calibration overdue since 12 January 2027'
		});
	});

	it('is none for a single reading or an instrument of another unit', () => {
		expect(cellUncertainty(summarise([100]), 'W', meter, '2026-11-11')).toBeNull();
		expect(cellUncertainty(summarise(readings), 'kW', meter, '2026-11-11')).toBeNull();
	});
});

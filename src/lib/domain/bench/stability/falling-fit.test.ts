import { expect, it } from 'vitest';
import { fallingFit } from './falling-fit';

const at = (currents: number[], clocks: number[]) =>
	currents.map((currentA, index) => ({ currentA, clockMHz: clocks[index] ?? NaN }));

// R 4.2.2: -isoreg(current, -clock)$yf
it('takes out the rises', () => {
	const fit = fallingFit(at([120, 130, 140, 150, 160, 170, 180], [5500, 5500, 5475, 5480, 5425, 5350, 5300]));
	expect(fit.map(({ clockMHz }) => clockMHz)).toEqual([5500, 5500, 5477.5, 5477.5, 5425, 5350, 5300]);
});

// R 4.2.2: isoreg(c(1, 0, 1, 2, 3, 4), c(5, 9, 1, 2, 5, 9)), turned upside down
it('sorts, and weighs readings at the same current together', () => {
	const fit = fallingFit(at([1, 0, 1, 2, 3, 4], [-5, -9, -1, -2, -5, -9]));
	expect(fit).toEqual([
		{ currentA: 0, clockMHz: -4.25, count: 1 },
		{ currentA: 1, clockMHz: -4.25, count: 2 },
		{ currentA: 2, clockMHz: -4.25, count: 1 },
		{ currentA: 3, clockMHz: -5, count: 1 },
		{ currentA: 4, clockMHz: -9, count: 1 }
	]);
});

it('refuses what is not a number', () => {
	expect(() => fallingFit([{ currentA: NaN, clockMHz: 5000 }])).toThrow(RangeError);
	expect(() => fallingFit([{ currentA: 100, clockMHz: NaN }])).toThrow(RangeError);
});

/**
 * One measured figure: the product's value and the control's, taken in the same run.
 * @typedef {{ name: string, value: number, control: number, goal: string, met: boolean }} Figure
 */

/** @param {number} x */
const short = (x) => (Number.isInteger(x) ? String(x) : x.toPrecision(4));

/** `name value control ratio goal`, in columns; a figure that misses its goal says so after it. @param {Figure} figure */
export const lineOf = ({ name, value, control, goal, met }) =>
	[
		// A value that is not a number stands for an answer that was not the page.
		name.padEnd(32),
		short(value).padStart(10),
		short(control).padStart(10),
		short(value / control).padStart(8),
		`  ${goal}${met ? '' : '   MISSED'}`
	].join(' ');

import { render } from 'svelte/server';
import Plate from '../../components/plates/Plate.svelte';
import type { PlateSpec } from '../../domain/articles/plates/spec';

const oneTag = /<[a-z][^<>]*>/gi;
/** What the chart library leaves behind that no reader needs: positions of its boxes, its data as words, its classes. */
const stray = /\s(?:style|class|data|(?!viewBox=)[a-z]+[A-Z][A-Za-z0-9]*)="[^"]*"/g;

/** One drawing as clean SVG: what stands between the tags is text and stays untouched. */
function drawing(spec: PlateSpec, narrow: boolean): string {
	const { body } = render(Plate, { props: { spec, narrow } });
	const svg = /<svg\b[\s\S]*<\/svg>/.exec(body)?.[0];
	if (!svg) throw new Error('The chart library drew no SVG.');
	return svg
		.replace(/<!--[\s\S]*?-->/g, '')
		.replace(oneTag, (tag) => tag.replace(stray, ''))
		.replace(/<defs><\/defs>/g, '')
		.replace(
			/^<svg/,
			`<svg class="${narrow ? 'plate-narrow' : 'plate-wide'}" xmlns="http://www.w3.org/2000/svg"`
		);
}

/** A plate as SVG markup: the wide drawing, and after it the narrow one that takes its place on a phone. */
export const drawPlate = (spec: PlateSpec): string => drawing(spec, false) + drawing(spec, true);

import { caution } from './caution';
import { disclosure } from './disclosure';
import { gain } from './gain';
import { kit } from './kit';
import { overallGain } from './overall';
import { plate } from './plate';
import { reading } from './reading';
import { results } from './results';
import type { AnyDirective } from './shape';
import { source } from './source';
import { steps } from './steps';

/** Every directive, in the order the insert panel shows them. */
export const allDirectives: readonly AnyDirective[] = [
	reading,
	gain,
	overallGain,
	plate,
	results,
	kit,
	steps,
	caution,
	disclosure,
	source
];

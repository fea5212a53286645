import { caution } from './caution';
import { compare, side } from './compare';
import { contents } from './contents';
import { disclosure } from './disclosure';
import { gain } from './gain';
import { gallery } from './gallery';
import { kit } from './kit';
import { note } from './note';
import { overallGain } from './overall';
import { plate } from './plate';
import { pull } from './pull';
import { reading } from './reading';
import { results } from './results';
import type { AnyDirective } from './shape';
import { source } from './source';
import { step } from './step';
import { steps } from './steps';
import { term } from './term';
import { tested } from './tested';
import { tradeoffs } from './tradeoffs';
import { verdict } from './verdict';

/** Every directive, in the order the insert panel shows them. */
export const allDirectives: readonly AnyDirective[] = [
	reading,
	gain,
	overallGain,
	term,
	plate,
	results,
	tradeoffs,
	verdict,
	tested,
	kit,
	steps,
	step,
	caution,
	disclosure,
	contents,
	note,
	pull,
	compare,
	side,
	gallery,
	source
];

import type { Token } from 'marked';
import { missing } from './shape';

/** A container without anything in it. */
export const emptyInside = (name: string): ReturnType<typeof missing> =>
	missing(`There is nothing in this “${name}”. Write between its opening line and :::.`);

/** The tokens that stand for something: empty lines are passed over. */
export const blocksOf = (tokens: readonly Token[]): Token[] =>
	tokens.filter((token) => token.type !== 'space' && token.type !== 'def');

/** A sentence's first letter raised. @example capital('games') === 'Games' */
export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** A heading as a sentence. @example asSentence('Which?') === 'Which?' */
export const asSentence = (text: string): string => (/[.!?…]$/.test(text) ? text : `${text}.`);

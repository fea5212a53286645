import { refuse, type Refusal } from './outcome';

/** A slug that another row has: said beside the field, with what was typed kept. */
export const slugTaken = (what: string, slug: string): Refusal<'conflict'> =>
	refuse('conflict', `Nothing was saved: another ${what} is called “${slug}”.`, {
		fields: { slug: [`Another ${what} has this short name. Choose a different one.`] }
	});

/** A name of which nothing can be spelled in ascii, or that spells a word the application's addresses use. */
export const slugMissing = (): Refusal<'invalid'> =>
	refuse('invalid', 'Nothing was saved: no short name can be made from this name.', {
		fields: { slug: ['No short name can be made from the name. Write one here, in a to z.'] }
	});

/** An edit over a newer version than the one that was seen. */
export const changedMeanwhile = (what: string, version: number): Refusal<'conflict'> =>
	refuse(
		'conflict',
		`Somebody changed this ${what} while you typed, so nothing was saved. What you typed is still here: open the ${what} in another tab, compare, and make your change there.`,
		{ detail: { version } }
	);

import { refuse } from '../../../domain/shared/outcome';
import type { MeaningInput } from '../../../schemas/firmware-meaning';

/** A setting of a family means one thing. */
export const meaningTaken = ({ family, setting }: Pick<MeaningInput, 'family' | 'setting'>) =>
	refuse('conflict', `Nothing was saved: what “${setting}” sets in ${family} is written down already.`, {
		fields: { setting: ['This setting of the family is in the list already. Change that line.'] }
	});

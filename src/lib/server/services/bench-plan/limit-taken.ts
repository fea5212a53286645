import { refuse } from '../../../domain/shared/outcome';
import type { LabLimitInput } from '../../../schemas/lab-limit';

/** There is one limit of a quantity on a kind of part. */
export const limitTaken = (_input: Pick<LabLimitInput, 'quantity'>) =>
	refuse('conflict', 'Nothing was saved: the lab has a limit of this on this kind of part already.', {
		fields: { quantity: ['There is a limit of this on this kind of part already. Change that one.'] }
	});

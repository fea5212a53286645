import type { SystemContext } from '../context';
import { remindOfLoans } from '../services/partners/remind-of-loans';

/** Each hour: a reminder whose day has come goes out in that day's first hours, whatever was restarted. */
export const loanReminders = async (ctx: SystemContext): Promise<void> => {
	await remindOfLoans(ctx);
};

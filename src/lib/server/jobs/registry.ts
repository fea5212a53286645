import type { JobHandler } from './handler';
import { loanReminders } from './loan-reminders';
import { publishScheduled } from './publish-article';
import { sendMail } from './send-mail';
import { sweep } from './sweep';

/** Every kind of job, and what does it. */
export const handlers: Record<string, JobHandler> = {
	'send-mail': sendMail,
	'publish-article': publishScheduled,
	'loan-reminders': loanReminders,
	sweep
};

/** Jobs that come again by themselves. */
export const recurring: { kind: string; everyMs: number }[] = [
	{ kind: 'loan-reminders', everyMs: 3_600_000 },
	{ kind: 'sweep', everyMs: 86_400_000 }
];

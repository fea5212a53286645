import type { SystemContext } from '../context';

/** What the outside world offers to a job. */
export interface JobTools {
	/** Hands one mail to the mail server; throws when it was not taken. */
	deliver: (mail: {
		messageId: string;
		recipient: string;
		subject: string;
		textBody: string;
		htmlBody: string;
	}) => Promise<void>;
}

/** Does one kind of job. It must be safe to run twice: a lease can end while the work goes on. */
export type JobHandler = (
	ctx: SystemContext,
	payload: Record<string, unknown>,
	tools: JobTools
) => Promise<void>;

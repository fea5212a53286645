import { inject } from 'vitest';

export interface ReceivedMail {
	id: string;
	subject: string;
	text: string;
	html: string;
	to: { address: string }[];
	headers: Record<string, string>;
}

/** Every mail the fake has received, oldest first. */
export const receivedMail = async (): Promise<ReceivedMail[]> =>
	(await (await fetch(`${inject('maildevUrl')}/api/email`)).json()) as ReceivedMail[];

export const forgetMail = async (): Promise<void> => {
	await fetch(`${inject('maildevUrl')}/api/email/all`, { method: 'DELETE' });
};

import type { EmailConfig } from '@auth/core/providers';
import { letter } from '../../domain/mail/letter';
import { sameSitePath } from '../../domain/people/same-site';
import { database } from '../app';
import { clock } from '../clock';
import * as settings from '../db/queries/settings';
import { env } from '../env';
import { post } from '../jobs/outbox';
import { hashOf } from './secret';

export const linkMinutes = 60;

/**
 * Auth.js's e-mailed link, through our outbox instead of its own transport. The link leads to a page with one button,
 * because mail filters open every address in a mail and would use the link up before its reader does.
 */
export const linkProvider: EmailConfig = {
	id: 'email',
	type: 'email',
	name: 'E-mail',
	maxAge: linkMinutes * 60,
	async sendVerificationRequest({ identifier, token, url }) {
		const { db } = database();
		const origin = env().ORIGIN.replace(/\/$/, '');
		const { name } = await settings.publication(db);
		const callback = new URL(url).searchParams.get('callbackUrl') ?? '';
		const to = sameSitePath(callback.startsWith(origin) ? callback.slice(origin.length) : callback, '');
		const link = `${origin}/sign-in/link?${new URLSearchParams({ email: identifier, token, ...(to && { to }) })}`;
		await post(db, clock.now(), [
			{
				messageId: `sign-in.${hashOf(token).slice(0, 32)}@${new URL(origin).hostname}`,
				recipient: identifier,
				...letter({
					subject: `Sign in to ${name}`,
					paragraphs: [
						`You asked for a link to sign in to ${name}. It works once, within ${linkMinutes} minutes.`
					],
					link: { label: 'Sign in', href: link },
					publication: name,
					because: 'If you did not ask for it, do nothing: without this mail nobody can sign in with it.'
				})
			}
		]);
	}
};

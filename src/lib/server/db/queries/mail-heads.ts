import { inArray } from 'drizzle-orm';
import type { Db } from '../client';
import { mail } from '../schema';

/** Whom mails are for and what they are about; never their words, which may hold a link. */
export const headsOf = async (db: Db, ids: number[]) =>
	ids.length === 0
		? []
		: db
				.select({ id: mail.id, recipient: mail.recipient, subject: mail.subject })
				.from(mail)
				.where(inArray(mail.id, ids));

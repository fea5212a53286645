import { eq, inArray } from 'drizzle-orm';
import type { Db } from '../client';
import { mail } from '../schema';

export interface OutgoingMail {
	/** Unique for the event and the recipient, without angle brackets; the same event is written once. */
	messageId: string;
	recipient: string;
	subject: string;
	textBody: string;
	htmlBody: string;
}

/** Writes mails to the outbox and returns the ids of all of them, new or there before. */
export async function write(
	db: Db,
	now: Date,
	mails: OutgoingMail[]
): Promise<{ id: number; messageId: string }[]> {
	if (mails.length === 0) return [];
	await db
		.insert(mail)
		.ignore()
		.values(mails.map((m) => ({ ...m, createdAt: now })));
	return db
		.select({ id: mail.id, messageId: mail.messageId })
		.from(mail)
		.where(
			inArray(
				mail.messageId,
				mails.map((m) => m.messageId)
			)
		);
}

/** A mail as the outbox holds it. */
export const byId = async (db: Db, id: number) =>
	(await db.select().from(mail).where(eq(mail.id, id)).limit(1))[0];

export const markSent = (db: Db, id: number, sentAt: Date) =>
	db.update(mail).set({ sentAt }).where(eq(mail.id, id));

import type { Db } from '../db/client';
import * as mails from '../db/queries/mail';
import type { OutgoingMail } from '../db/queries/mail';
import { enqueue } from './queue';

/** Puts mails into the outbox in the caller's transaction; the `send-mail` job carries each out once. */
export async function post(db: Db, now: Date, outgoing: OutgoingMail[]): Promise<void> {
	const written = await mails.write(db, now, outgoing);
	await enqueue(
		db,
		now,
		written.map(({ id, messageId }) => ({
			kind: 'send-mail',
			payload: { mailId: id },
			runAt: now,
			dedupeKey: `send-mail:${messageId}`
		}))
	);
}

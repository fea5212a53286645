import { and, eq, lt, sql } from 'drizzle-orm';
import { errno, isDuplicate, type Db, type Transaction } from '../client';
import { idempotencyKey } from '../schema';

export interface KeyedRequest {
	userId: string;
	key: string;
	method: string;
	path: string;
	bodyHash: string;
	createdAt: Date;
}

const lockWaitTimeout = 1205;

/**
 * Claims a key inside the transaction that does its work. 'busy' while another transaction has claimed it and
 * not ended; 'taken' when one ended before. The claim waits for nobody: who comes second is told at once.
 */
export async function claim(tx: Transaction, row: KeyedRequest): Promise<'claimed' | 'busy' | 'taken'> {
	const { userId, key, method, path, bodyHash, createdAt } = row;
	try {
		await tx.execute(
			sql`set statement innodb_lock_wait_timeout = 0 for insert into ${idempotencyKey} (user_id, \`key\`, method, path, body_hash, created_at) values (${userId}, ${key}, ${method}, ${path}, ${bodyHash}, ${createdAt.toISOString().slice(0, 23).replace('T', ' ')})`
		);
		return 'claimed';
	} catch (error) {
		if (errno(error) === lockWaitTimeout) return 'busy';
		if (isDuplicate(error)) return 'taken';
		throw error;
	}
}

const same = (userId: string, key: string) =>
	and(eq(idempotencyKey.userId, userId), eq(idempotencyKey.key, key));

/** The finished request under a key. */
export async function read(db: Db, userId: string, key: string) {
	const [row] = await db.select().from(idempotencyKey).where(same(userId, key));
	return row ?? null;
}

/** Keeps the answer under a claimed key. */
export const keep = (
	tx: Transaction,
	userId: string,
	key: string,
	answer: { status: number; body: string; location: string | null }
) => tx.update(idempotencyKey).set(answer).where(same(userId, key));

/** Forgets one key that is older than the moment given. */
export const forget = (db: Db, userId: string, key: string, before: Date) =>
	db.delete(idempotencyKey).where(and(same(userId, key), lt(idempotencyKey.createdAt, before)));

/** Clears away keys older than the moment given. */
export const sweep = (db: Db, before: Date) =>
	db.delete(idempotencyKey).where(lt(idempotencyKey.createdAt, before));

import type { Pool, RowDataPacket } from 'mysql2/promise';
import { RateLimiterMySQL, RateLimiterRes } from 'rate-limiter-flexible';
import type { Db } from '../db/client';

const minute = 60;

/** Attempts within a time, in seconds. The account's limit stops guessing at one person, the address's at many. */
const rules = {
	'password-account': { points: 8, duration: 15 * minute },
	'password-address': { points: 40, duration: 15 * minute },
	'link-account': { points: 5, duration: 60 * minute },
	'link-address': { points: 20, duration: 60 * minute }
} as const;

export type LimitName = keyof typeof rules;
type Limiters = Record<LimitName, RateLimiterMySQL>;

const made = new WeakMap<Pool, Promise<Limiters>>();

/** The pool under Drizzle: a limiter counts on a connection of its own, so that a rollback does not give attempts back. */
function poolOf(db: Db): Pool {
	const client: unknown = '$client' in db ? db.$client : null;
	if (typeof client !== 'object' || client === null || !('pool' in client))
		throw new Error('Limits are counted outside of transactions.');
	return client as Pool;
}

async function makeLimiters(pool: Pool): Promise<Limiters> {
	const [[database]] = await pool.query<RowDataPacket[]>('select database() as name');
	const limiter = (name: LimitName) =>
		new RateLimiterMySQL({
			storeClient: pool.pool,
			storeType: 'pool',
			dbName: String(database?.name),
			tableName: 'rate_limit',
			tableCreated: true,
			keyPrefix: name,
			...rules[name]
		});
	return {
		'password-account': limiter('password-account'),
		'password-address': limiter('password-address'),
		'link-account': limiter('link-account'),
		'link-address': limiter('link-address')
	};
}

function limitersOf(db: Db): Promise<Limiters> {
	const pool = poolOf(db);
	const there = made.get(pool) ?? makeLimiters(pool);
	made.set(pool, there);
	return there;
}

/** Counts one attempt under each key. Returns how many milliseconds to wait, or null when none of them is full. */
export async function countAttempt(db: Db, keys: Partial<Record<LimitName, string>>): Promise<number | null> {
	const limiters = await limitersOf(db);
	const names = Object.keys(keys) as LimitName[];
	const results = await Promise.allSettled(names.map((name) => limiters[name].consume(keys[name] ?? '')));
	const refused = results
		.filter((result) => result.status === 'rejected')
		.map((result) => result.reason as unknown);
	const failure = refused.find((reason) => !(reason instanceof RateLimiterRes));
	if (failure) throw failure;
	const waits = refused
		.filter((reason) => reason instanceof RateLimiterRes)
		.map((reason) => reason.msBeforeNext);
	return waits.length > 0 ? Math.max(...waits) : null;
}

/** After a success: the account starts afresh, the address gets its point back. */
export async function forgiveAttempt(db: Db, account: string, address: string): Promise<void> {
	const limiters = await limitersOf(db);
	await Promise.all([
		limiters['password-account'].delete(account),
		limiters['password-address'].reward(address, 1)
	]);
}

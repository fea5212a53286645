import type { Adapter } from '@auth/core/adapters';
import { DrizzleAdapter } from '@auth/drizzle-adapter';
import { inTransaction, type Connection, type Db } from '../db/client';
import * as sessions from '../db/queries/sessions';
import { account, session, user, verificationToken } from '../db/schema';

// The adapter's types ask for TIMESTAMP columns; ours are DATETIME(3), which read and write the same Date.
const tables = {
	usersTable: user,
	accountsTable: account,
	sessionsTable: session,
	verificationTokensTable: verificationToken
} as unknown as Parameters<typeof DrizzleAdapter<Connection>>[1];

/** Auth.js on our tables. A link's token is taken in one locked step, so that two clicks at once are one sign-in. */
export const adapterOf = (db: Db): Adapter => ({
	...DrizzleAdapter(db, tables),
	useVerificationToken: ({ identifier, token }) =>
		inTransaction(db, (tx) => sessions.takeVerificationToken(tx, identifier, token))
});

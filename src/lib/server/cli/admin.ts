import { email } from '../../schemas/people';
import type { Connection } from '../db/client';
import { makeFirstAdmin } from '../services/people/make-first-admin';

interface Tools {
	db: Connection;
	now: Date;
	origin: string;
	print: (line: string) => void;
}

/** `npm run admin -- EMAIL`: makes an admin and prints a link to set a password. Returns the exit code. */
export async function run(args: string[], { db, now, origin, print }: Tools): Promise<number> {
	const address = email.safeParse(args[0] ?? '');
	if (args.length !== 1 || !address.success) {
		print('Usage: npm run admin -- EMAIL');
		if (args.length === 1) print(`${args[0]}: this is not an e-mail address.`);
		return 2;
	}
	const made = await makeFirstAdmin({ db, now, origin }, address.data);
	print(`${address.data} is ${made.isNew ? 'here now, as' : 'now'} an admin.`);
	print(`Set a password with this link. It works once, within ${made.hours} hours:`);
	print(made.url);
	return 0;
}

import { scopes, type Actor } from '../../domain/people/roles';
import { email, tokenInput } from '../../schemas/people';
import type { Connection } from '../db/client';
import * as people from '../db/queries/people';
import { createToken } from '../services/people/create-token';

interface Tools {
	db: Connection;
	now: Date;
	origin: string;
	print: (line: string) => void;
}

async function actorOf(db: Connection, address: string): Promise<Actor | null> {
	const facts = await people.signInFacts(db, address);
	if (!facts?.mayEnter) return null;
	const roles = (await people.rolesOf(db, [facts.id])).map((row) => row.role);
	return { id: facts.id, name: facts.name, email: facts.email, roles };
}

/** `npm run token -- EMAIL SCOPE…`: prints one personal token of a year, alone on its line. Returns the exit code. */
export async function run(args: string[], { db, now, origin, print }: Tools): Promise<number> {
	const address = email.safeParse(args[0] ?? '');
	const input = tokenInput.safeParse({
		name: 'made on the command line',
		scopes: args.slice(1),
		days: '365'
	});
	if (!address.success || !input.success) {
		print(`Usage: npm run token -- EMAIL SCOPE…   with scopes among ${scopes.join(', ')}`);
		return 2;
	}
	const actor = await actorOf(db, address.data);
	if (!actor) {
		print(`${address.data} cannot sign in here, so no token was made.`);
		return 1;
	}
	const outcome = await createToken({ db, actor, now, origin }, input.data);
	print(outcome.ok ? outcome.value.token : outcome.message);
	return outcome.ok ? 0 : 1;
}

import { hash, verify } from '@node-rs/argon2';

// argon2id (the library's default) with 19 MiB, 2 passes, 1 lane: the minimum of OWASP's Password Storage
// Cheat Sheet (value from memory). Written out so that a new default does not change it unseen.
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** One spelling for the same typed characters on every keyboard. */
const spelled = (password: string) => password.normalize('NFKC');

/** The argon2id hash to store. */
export const hashPassword = (password: string): Promise<string> => hash(spelled(password), cost);

let nobody: Promise<string> | undefined;

/** Whether the password fits. Without a stored hash it does the same work and says no. */
export async function passwordFits(stored: string | null | undefined, password: string): Promise<boolean> {
	const against = stored ?? (await (nobody ??= hashPassword('the password of nobody at all')));
	const fits = await verify(against, spelled(password));
	return fits && stored !== null && stored !== undefined;
}

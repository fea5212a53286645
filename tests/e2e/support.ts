import {
	expect,
	type APIRequestContext,
	type Browser,
	type BrowserContextOptions,
	type Page
} from '@playwright/test';

export type Role = 'tester' | 'writer' | 'editor' | 'liaison' | 'admin';
export const address = (role: Role) => `${role}@northlight.example`;
const password = 'measure-then-print';

/** Signs a person of the demo in through the page, as they would. */
export const signIn = (page: Page, role: Role): Promise<void> => signInAs(page, address(role));

/** As signIn, of somebody by their address. */
export async function signInAs(page: Page, email: string): Promise<void> {
	await page.goto('/sign-in');
	await page.locator('form[action="?/password"] input[name=email]').fill(email);
	await page.locator('input[name=password]').fill(password);
	await page.getByRole('button', { name: 'Sign in', exact: true }).click();
	await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

/** A page of its own for a person, signed in; close its context when done. */
export async function pageOf(
	browser: Browser,
	role: Role,
	options: BrowserContextOptions = {}
): Promise<Page> {
	const page = await (await browser.newContext(options)).newPage();
	await signIn(page, role);
	return page;
}

export interface Mail {
	subject: string;
	text: string;
	html: string;
	to: { address: string }[];
}

const maildev = () => process.env.MAILDEV_URL ?? '';

/** Waits for the newest mail to a person whose subject and text hold what is asked for. */
export async function mailTo(request: APIRequestContext, recipient: string, holds: RegExp): Promise<Mail> {
	let found: Mail | undefined;
	await expect
		.poll(
			async () => {
				const mails = (await (await request.get(`${maildev()}/api/email`)).json()) as Mail[];
				found = mails
					.filter(
						(mail) =>
							mail.to.some((to) => to.address === recipient) && holds.test(`${mail.subject}\n${mail.text}`)
					)
					.at(-1);
				return found !== undefined;
			},
			{ message: `a mail to ${recipient} with ${String(holds)}`, timeout: 20_000 }
		)
		.toBe(true);
	if (!found) throw new Error('no such mail');
	return found;
}

/** The one link of a mail, as a path. */
export const linkIn = (mail: Mail): string => {
	const href = /https?:\/\/\S+/.exec(mail.text)?.[0];
	if (!href) throw new Error('This mail has no link.');
	const { pathname, search } = new URL(href);
	return pathname + search;
};

/** Sends JSON with a token; fails the test with the answer's own words when it is refused. */
export async function send<T>(
	request: APIRequestContext,
	token: string,
	path: string,
	data: unknown
): Promise<T> {
	const answer = await request.post(`/api/v1${path}`, {
		data,
		headers: { authorization: `Bearer ${token}`, 'idempotency-key': crypto.randomUUID() }
	});
	expect(answer.status(), `${path}: ${await answer.text()}`).toBe(201);
	return (await answer.json()) as T;
}

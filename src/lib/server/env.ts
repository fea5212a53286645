import { z } from 'zod';

const url = (protocols: string[]) =>
	z
		.string()
		.refine(
			(value) => URL.canParse(value) && protocols.includes(new URL(value).protocol),
			`is not a ${protocols.join(' or ')} address`
		);

const oneOf = <const T extends string>(...words: T[]) => z.enum(words, `is not one of ${words.join(', ')}`);

const schema = z.object({
	NODE_ENV: z.string().default('production'),
	HOST: z.string().min(1).default('127.0.0.1'),
	PORT: z.coerce.number('is not a number').int().min(1).max(65535).default(3000),
	/** Where people reach the application; cookies, mails and feeds are built on it. */
	ORIGIN: url(['http:', 'https:']).default('http://localhost:3000'),
	DATABASE_URL: url(['mysql:', 'mariadb:']),
	SMTP_URL: url(['smtp:', 'smtps:']),
	MAIL_FROM: z.string().min(3).default('Calipress <desk@localhost>'),
	DATA_DIR: z.string().min(1).default('data'),
	/** Signs e-mailed links; at least 32 characters. */
	AUTH_SECRET: z.string().min(32, 'has fewer than 32 characters'),
	LOG_LEVEL: oneOf('trace', 'debug', 'info', 'warn', 'error', 'fatal', 'silent').default('info'),
	/** Whether this process works on jobs; off for a process that only serves. */
	JOBS: oneOf('on', 'off').default('on'),
	/** Fill an empty database with the demo; only the start script sets it, and only with its own database. */
	DEMO: oneOf('on', 'off').default('off'),
	/** How long the end waits for what is in flight; the server script reads it. */
	SHUTDOWN_TIMEOUT_MS: z.coerce.number('is not a number').int().min(0).max(600_000).default(20_000),
	/** How long `/readyz` says no before the port closes, for a load balancer to notice. */
	SHUTDOWN_NOTICE_MS: z.coerce.number('is not a number').int().min(0).max(600_000).default(0),
	/** The largest body of any kind; what a route takes is less. */
	BODY_SIZE_LIMIT: z.string().default('64M'),
	/** Reverse proxies to trust for the visitor's address; 0 when people connect directly. */
	PROXY_DEPTH: z.coerce.number('is not a number').int().min(0).max(5).default(0)
});

export type Env = z.infer<typeof schema>;

/**
 * Reads and checks the environment. An empty variable counts as not given.
 * @throws Error with one line that names the first wrong variable.
 */
export function readEnv(source: Record<string, string | undefined>): Env {
	const given = Object.fromEntries(
		Object.entries(source).filter(([, value]) => value !== undefined && value !== '')
	);
	const parsed = schema.safeParse(given);
	if (parsed.success) return parsed.data;
	const issue = parsed.error.issues[0];
	const name = String(issue?.path[0] ?? 'environment');
	throw new Error(`${name} ${given[name] === undefined ? 'is not set' : (issue?.message ?? 'is wrong')}`);
}

let cached: Env | undefined;

/** The checked environment of this process. */
export const env = (): Env => (cached ??= readEnv(process.env));

import { describe, expect, it } from 'vitest';
import { readEnv } from './env';

const right = {
	DATABASE_URL: 'mysql://root@127.0.0.1:3306/calipress',
	SMTP_URL: 'smtp://127.0.0.1:25',
	AUTH_SECRET: 'a secret that only this test knows, 32+'
};

describe('the environment', () => {
	it('fills in what is not given, and takes an empty variable as not given', () => {
		expect(readEnv({ ...right, PORT: '', JOBS: undefined })).toMatchObject({
			PORT: 3000,
			ORIGIN: 'http://localhost:3000',
			JOBS: 'on',
			DEMO: 'off'
		});
	});

	it.each([
		['DATABASE_URL', undefined, 'is not set'],
		['DATABASE_URL', 'postgres://127.0.0.1/x', 'is not a mysql: or mariadb: address'],
		['SMTP_URL', 'localhost:25', 'is not a smtp: or smtps: address'],
		['ORIGIN', 'lab.example', 'is not a http: or https: address'],
		['PORT', 'three', 'is not a number'],
		['AUTH_SECRET', 'short', 'has fewer than 32 characters'],
		['LOG_LEVEL', 'loud', 'is not one of trace, debug, info, warn, error, fatal, silent'],
		['JOBS', 'yes', 'is not one of on, off'],
		['SHUTDOWN_TIMEOUT_MS', 'soon', 'is not a number']
	])('%s=%s stops with one line that names it', (name, value, words) => {
		expect(() => readEnv({ ...right, [name]: value })).toThrow(new Error(`${name} ${words}`));
	});

	it('does not repeat a secret in its line', () => {
		expect(() => readEnv({ ...right, AUTH_SECRET: 'short-and-secret' })).toThrow(/^(?!.*short-and-secret)/);
	});
});

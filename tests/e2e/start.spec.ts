import { expect, test } from '@playwright/test';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort, startScript } from './child';

test('npm start: keeps its data, survives being killed, and begins anew when asked to', async () => {
	test.setTimeout(240_000);
	const folder = mkdtempSync(join(tmpdir(), 'calipress-start-'));
	const port = String(await freePort());
	// None of what these tests run with: the start brings its own.
	const env = {
		PORT: port,
		DATA_DIR: folder,
		DATABASE_URL: undefined,
		SMTP_URL: undefined,
		ORIGIN: undefined,
		AUTH_SECRET: undefined,
		DEMO: undefined
	};
	const origin = `http://localhost:${port}`;
	const start = async (...args: string[]) => {
		const app = startScript('start.mjs', args, env);
		await app.said(/Ctrl-C ends it/);
		return app;
	};
	const me = async (token: string) =>
		(await fetch(`${origin}/api/v1/me`, { headers: { authorization: `Bearer ${token}` } })).status;
	try {
		const first = await start();
		for (const words of [origin, 'tester@', 'measure-then-print', 'Mail it sends'])
			expect(first.words()).toContain(words);
		expect((await fetch(`${origin}/sign-in`)).status).toBe(200);
		const made = startScript('run.mjs', ['token', 'tester@northlight.example', 'bench:read'], env);
		const token = await made.said(/calipress_[\w-]+/);
		expect(await made.ended).toBe(0);
		expect(await me(token)).toBe(200);

		const second = startScript('start.mjs', ['--fresh'], { ...env, PORT: String(await freePort()) });
		expect(await second.ended).toBe(1);
		expect(second.words()).toMatch(/^Calipress cannot start: process \d+ is using the database/);

		first.kill('SIGINT');
		expect(await first.ended).toBe(0);
		const again = await start();
		expect(await me(token), 'the data was kept').toBe(200);
		again.kill('SIGKILL');
		await again.ended;
		await expect.poll(() => fetch(origin).catch(() => 'gone'), { timeout: 30_000 }).toBe('gone');

		const fresh = await start('--fresh', '--empty');
		expect(fresh.words()).toContain('npm run admin');
		expect(fresh.words()).not.toContain('measure-then-print');
		expect(await me(token), 'the data is gone').toBe(401);
		fresh.kill('SIGTERM');
		expect(await fresh.ended).toBe(0);
	} finally {
		rmSync(folder, { recursive: true, force: true });
	}
});

test('npm start: a folder that is not ours is left alone', async () => {
	const folder = mkdtempSync(join(tmpdir(), 'calipress-start-'));
	writeFileSync(join(folder, 'letters.txt'), 'not ours');
	const app = startScript('start.mjs', ['--fresh'], {
		PORT: String(await freePort()),
		DATA_DIR: folder,
		DATABASE_URL: undefined
	});
	expect(await app.ended).toBe(1);
	expect(app.words()).toContain('nothing was touched');
	rmSync(folder, { recursive: true });
});

import { expect, test } from '@playwright/test';
import { createConnection, type ResultSetHeader, type RowDataPacket } from 'mysql2/promise';
import { connect } from 'node:net';
import { freePort, startScript } from './child';

const everywhere = {
	'x-content-type-options': 'nosniff',
	'x-frame-options': 'DENY',
	'referrer-policy': 'strict-origin-when-cross-origin',
	'cross-origin-opener-policy': 'same-origin',
	'cross-origin-resource-policy': 'same-origin'
};

test('every answer carries the security headers, whoever gives it', async ({ request, baseURL }) => {
	const page = await request.get('/sign-in');
	const asset = /\/_app\/immutable\/[\w./-]+\.css/.exec(await page.text())?.[0] ?? 'no style sheet';
	const answers = await Promise.all([
		request.get('/'),
		request.get(asset),
		request.get('/favicon.svg'),
		request.get('/no-such-page'),
		request.get('/bench', { maxRedirects: 0 }),
		request.get('/feed.atom'),
		request.get('/api/v1/me'),
		request.get('/api/v1/no-such-thing'),
		request.post('/sign-in?/link', {
			form: { email: 'x' },
			headers: { origin: 'https://elsewhere.example' }
		}),
		request.post('/sign-in?/link', { form: { email: 'x'.repeat(3e6) }, headers: { origin: baseURL ?? '' } })
	]);
	expect(answers.map((answer) => answer.status())).toEqual([
		200, 200, 200, 404, 303, 200, 401, 404, 403, 413
	]);
	for (const answer of [...answers, page]) {
		expect(answer.headers(), answer.url()).toMatchObject(everywhere);
		expect(answer.headers()['content-security-policy'], answer.url()).toContain("frame-ancestors 'none'");
		expect(answer.headers()['content-security-policy'], answer.url()).not.toContain("script-src 'unsafe");
	}
});

test('a wrong environment stops the start with one line that names it', async () => {
	for (const [env, line] of [
		[{ ORIGIN: 'lab.example' }, 'ORIGIN is not a http: or https: address'],
		[{ AUTH_SECRET: 'short' }, 'AUTH_SECRET has fewer than 32 characters'],
		[{ LOG_LEVEL: 'loud' }, 'LOG_LEVEL is not one of trace, debug, info, warn, error, fatal, silent'],
		[{ DATABASE_URL: '' }, 'DATABASE_URL is not set']
	] as const) {
		const app = startScript('serve.mjs', [], { PORT: String(await freePort()), ...env });
		expect(await app.ended).toBe(1);
		expect(app.words().trim()).toBe(`Calipress cannot start: ${line}`);
	}
});

test('a port in use is said in one line', async ({ baseURL }) => {
	const { port } = new URL(baseURL ?? '');
	const app = startScript('serve.mjs', [], { PORT: port });
	expect(await app.ended).toBe(1);
	expect(app.words().trim()).toBe(`Calipress cannot start: PORT ${port} is in use on 127.0.0.1`);
});

test('asked to end, it says not ready, answers what is in flight, and ends', async () => {
	const port = await freePort();
	const origin = `http://localhost:${port}`;
	const app = startScript('serve.mjs', [], {
		PORT: String(port),
		ORIGIN: origin,
		JOBS: 'off',
		SHUTDOWN_NOTICE_MS: '3000'
	});
	await app.listening();
	const body = 'email=nobody%40northlight.example';
	const socket = connect(port, '127.0.0.1');
	let answer = '';
	socket.on('data', (chunk) => (answer += chunk.toString()));
	const closed = new Promise((done) => socket.once('close', done));
	socket.write(
		[
			'POST /sign-in?/link HTTP/1.1',
			`host: localhost:${port}`,
			`origin: ${origin}`,
			'content-type: application/x-www-form-urlencoded',
			`content-length: ${body.length}`,
			'',
			body.slice(0, 10)
		].join('\r\n')
	);
	await expect.poll(async () => (await fetch(`${origin}/readyz`)).status).toBe(200);
	app.kill('SIGTERM');
	await expect.poll(async () => (await fetch(`${origin}/readyz`)).status).toBe(503);
	// Half of the form has come, and no more could: what is in flight may still arrive whole.
	socket.write(body.slice(10));
	await closed;
	expect(answer).toMatch(/^HTTP\/1\.1 (200|303)/);
	expect(answer).toMatch(/\r\nconnection: close\r\n/i);
	expect(await app.ended).toBe(0);
	await expect(fetch(`${origin}/healthz`)).rejects.toThrow();
});

test('two processes lose no mail when one of them is killed, and send none again that was sent', async () => {
	const mails = 200;
	const connection = await createConnection({ uri: process.env.DATABASE_URL, timezone: 'Z' });
	const other = startScript('serve.mjs', [], { PORT: String(await freePort()) });
	await other.listening();
	const now = new Date();
	const [written] = await connection.query<ResultSetHeader>(
		'insert into mail (message_id, recipient, subject, text_body, html_body, created_at) values ?',
		[
			Array.from({ length: mails }, (_, n) => [
				`kill-${n}@calipress`,
				'lost@northlight.example',
				`Kill ${n}`,
				'Words.',
				'<p>Words.</p>',
				now
			])
		]
	);
	await connection.query('insert into job (kind, payload, run_at, created_at) values ?', [
		Array.from({ length: mails }, (_, n) => [
			'send-mail',
			JSON.stringify({ mailId: written.insertId + n }),
			now,
			now
		])
	]);
	const sent = async () => {
		const [rows] = await connection.query<RowDataPacket[]>(
			"select count(*) as n from mail where recipient = 'lost@northlight.example' and sent_at is not null"
		);
		return Number(rows[0]?.n);
	};
	await expect.poll(sent, { intervals: [5] }).toBeGreaterThan(20);
	other.kill('SIGKILL');
	await other.ended;
	// What the killed process held comes back when its lease has ended; time is moved on for it.
	const [held] = await connection.query<ResultSetHeader>(
		"update job set leased_until = run_at where kind = 'send-mail' and state = 'waiting' and leased_until is not null"
	);
	await expect.poll(sent, { timeout: 60_000 }).toBe(mails);
	await connection.end();
	const received = (
		(await (await fetch(`${process.env.MAILDEV_URL}/api/email`)).json()) as { subject: string }[]
	).filter(({ subject }) => subject.startsWith('Kill '));
	expect(new Set(received.map(({ subject }) => subject)).size).toBe(mails);
	// Only what was in somebody's hands when the lease was taken away can have gone twice.
	expect(received.length - mails).toBeLessThanOrEqual(held.affectedRows);
});

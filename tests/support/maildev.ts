import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort } from './mariadb';

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

/** Starts the local mail fake: real SMTP in, JSON out. */
export async function startMaildev(): Promise<{
	smtpUrl: string;
	webUrl: string;
	stop: () => Promise<void>;
}> {
	const folder = mkdtempSync(join(tmpdir(), 'cal-mail-'));
	const [smtp, web] = [await freePort(), await freePort()];
	const child = spawn(
		process.execPath,
		[
			'node_modules/.bin/maildev',
			'--smtp',
			String(smtp),
			'--ip',
			'127.0.0.1',
			'--web',
			String(web),
			'--web-ip',
			'127.0.0.1',
			'--mail-directory',
			folder
		],
		{ stdio: 'ignore' }
	);
	const webUrl = `http://127.0.0.1:${web}`;
	for (let attempt = 0; ; attempt++) {
		const up = await fetch(`${webUrl}/api/healthz`).then(
			(r) => r.ok,
			() => false
		);
		if (up) break;
		if (attempt >= 200 || child.exitCode !== null) throw new Error('MailDev did not answer.');
		await pause(100);
	}
	const stop = async () => {
		const ended = new Promise((resolve) => child.once('exit', resolve));
		child.kill('SIGTERM');
		await ended;
		rmSync(folder, { recursive: true, force: true });
	};
	return { smtpUrl: `smtp://127.0.0.1:${smtp}`, webUrl, stop };
}

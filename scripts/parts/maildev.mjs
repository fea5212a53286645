import { mkdirSync } from 'node:fs';
import { startService } from './child.mjs';
import { freePort, listens, pause } from './mariadb.mjs';

/**
 * Starts the local mail fake: real SMTP in, a page and JSON out, nothing leaves the machine.
 * @param {{ folder: string, smtpPort?: number, webPort?: number }} options where received mails are kept; ports that are taken are replaced
 * @returns {Promise<{ smtpUrl: string, webUrl: string, smtpPort: number, webPort: number, stop: () => Promise<void> }>}
 */
export async function startMaildev({ folder, smtpPort, webPort }) {
	mkdirSync(folder, { recursive: true });
	const smtp = smtpPort && !(await listens(smtpPort)) ? smtpPort : await freePort();
	const web = webPort && !(await listens(webPort)) ? webPort : await freePort();
	const child = startService(process.execPath, [
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
	]);
	const exited = new Promise((done) => child.once('exit', done));
	const webUrl = `http://127.0.0.1:${web}`;
	for (let attempt = 0; ; attempt++) {
		const up = await fetch(`${webUrl}/api/healthz`).then(
			(answer) => answer.ok,
			() => false
		);
		if (up) break;
		if (child.exitCode !== null || attempt > 200) throw new Error('the mail fake did not start.');
		await pause(100);
	}
	const stop = async () => {
		child.kill('SIGTERM');
		await exited;
	};
	return { smtpUrl: `smtp://127.0.0.1:${smtp}`, webUrl, smtpPort: smtp, webPort: web, stop };
}

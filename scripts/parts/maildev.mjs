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
	for (let left = 2; ; left--) {
		const smtp = smtpPort && !(await listens(smtpPort)) ? smtpPort : await freePort();
		const web = webPort && !(await listens(webPort)) ? webPort : await freePort();
		const service = await tryMaildev(folder, smtp, web);
		if (service) return service;
		// A port that was free a moment ago is not: somebody else was quicker. Others are taken the next time.
		if (left === 0) throw new Error('the mail fake did not start.');
		smtpPort = webPort = undefined;
	}
}

/** @param {string} folder @param {number} smtpPort @param {number} webPort */
async function tryMaildev(folder, smtpPort, webPort) {
	const child = startService(process.execPath, [
		'node_modules/.bin/maildev',
		'--smtp',
		String(smtpPort),
		'--ip',
		'127.0.0.1',
		'--web',
		String(webPort),
		'--web-ip',
		'127.0.0.1',
		'--mail-directory',
		folder
	]);
	const exited = new Promise((done) => child.once('exit', done));
	const stop = async () => {
		child.kill('SIGTERM');
		await exited;
	};
	const webUrl = `http://127.0.0.1:${webPort}`;
	for (let attempt = 0; child.exitCode === null && attempt <= 200; attempt++) {
		const up = await fetch(`${webUrl}/api/healthz`).then(
			(answer) => answer.ok,
			() => false
		);
		if (up) return { smtpUrl: `smtp://127.0.0.1:${smtpPort}`, webUrl, smtpPort, webPort, stop };
		await pause(100);
	}
	await stop();
	return undefined;
}

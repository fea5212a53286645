import type { TestProject } from 'vitest/node';
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { startMaildev } from '../../scripts/parts/maildev.mjs';
import { startMariadb } from '../../scripts/parts/mariadb.mjs';
import { scratchFolder } from '../../scripts/parts/scratch.mjs';

declare module 'vitest' {
	interface ProvidedContext {
		databaseServerUrl: string;
		smtpUrl: string;
		maildevUrl: string;
	}
}

/** One MariaDB and one mail fake for all integration tests; each test file has databases of its own in it. */
export default async function setup(project: TestProject) {
	const folder = scratchFolder('test');
	const [mariadb, maildev] = await Promise.all([
		startMariadb({ folder: join(folder, 'mariadb'), throwaway: true }),
		startMaildev({ folder: join(folder, 'mail') })
	]);
	project.provide('databaseServerUrl', mariadb.url);
	project.provide('smtpUrl', maildev.smtpUrl);
	project.provide('maildevUrl', maildev.webUrl);
	return async () => {
		await Promise.all([mariadb.stop(), maildev.stop()]);
		rmSync(folder, { recursive: true, force: true });
	};
}

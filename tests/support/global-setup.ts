import type { TestProject } from 'vitest/node';
import { startMaildev } from './maildev';
import { startMariadb } from './mariadb';

declare module 'vitest' {
	interface ProvidedContext {
		databaseServerUrl: string;
		smtpUrl: string;
		maildevUrl: string;
	}
}

/** One MariaDB and one mail fake for all integration tests; each test file has databases of its own in it. */
export default async function setup(project: TestProject) {
	const [mariadb, maildev] = await Promise.all([startMariadb(), startMaildev()]);
	project.provide('databaseServerUrl', mariadb.url);
	project.provide('smtpUrl', maildev.smtpUrl);
	project.provide('maildevUrl', maildev.webUrl);
	return async () => {
		await Promise.all([mariadb.stop(), maildev.stop()]);
	};
}

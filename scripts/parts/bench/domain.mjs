import { createServer } from 'vite';

/**
 * Loads modules of the domain as the application has them, for measuring without a build.
 * @template T @param {(load: (path: string) => Promise<Record<string, any>>) => Promise<T>} work
 */
export async function withDomain(work) {
	const vite = await createServer({
		server: { middlewareMode: true, hmr: false, ws: false },
		appType: 'custom',
		logLevel: 'error',
		optimizeDeps: { noDiscovery: true, include: [] }
	});
	try {
		return await work((path) => vite.ssrLoadModule(`/src/lib/domain/bench/${path}`));
	} finally {
		await vite.close();
	}
}

import { createServer } from 'vite';

/**
 * Loads modules of the domain as the application has them, for measuring without a build: those of the bench by their
 * name, others by their path from the root.
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
		return await work((path) =>
			vite.ssrLoadModule(path.startsWith('/') ? path : `/src/lib/domain/bench/${path}`)
		);
	} finally {
		await vite.close();
	}
}

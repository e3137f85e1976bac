/** `npm run dev`: the same as `npm start`, with Vite's development server in place of the build. */
import { startNode } from './ground/child';
import { reachable } from './app/address';
import { serve } from './app/serve';
import { untilReady } from './app/server';

await serve({
	verb: 'dev',
	firstPort: 5173,
	start: async ({ host, port, origin }) => {
		const vite = startNode(
			['node_modules/vite/bin/vite.js', 'dev', '--host', host, '--port', String(port), '--strictPort'],
			{ HOST: host, PORT: String(port), ORIGIN: origin }
		);
		await untilReady(vite, `http://${reachable(host)}:${port}/`);
		return vite;
	}
});

/** `npm start`: the production build on a database, from nothing but Node.js. */
import { ensureBuild } from './app/build';
import { startBuilt } from './app/server';
import { serve } from './app/serve';

const BUILD_FOLDER = 'build';

await serve({
	verb: 'start',
	firstPort: 3000,
	build: () => ensureBuild(BUILD_FOLDER),
	start: (address) => startBuilt(BUILD_FOLDER, address)
});

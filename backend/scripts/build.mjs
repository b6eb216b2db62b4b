/** `npm run build`: builds the server and the page where their sources changed. */
import { ensureBuilt } from './lib/build.mjs';
import { runCommandLine } from './lib/lifetime.mjs';
import { checkPlatform } from './lib/node-version.mjs';
import { prepareDataFolders } from './lib/paths.mjs';
import { say } from './lib/problem.mjs';

async function build() {
  checkPlatform();
  prepareDataFolders();
  await ensureBuilt(['server', 'page']);
  say('Server and page are built: backend/dist, frontend/dist.');
}

runCommandLine(build);

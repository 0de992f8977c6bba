// npm start: installs and builds when needed, then runs the server in this process, so that signals reach it.
import path from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

process.chdir(path.join(path.dirname(fileURLToPath(import.meta.url)), '..'));
const { installWhenNeeded } = await import('./install.mjs');
installWhenNeeded();
const { buildWhenNeeded } = await import('./building.mjs');
await buildWhenNeeded();
await import(pathToFileURL('dist/server/main.js').href);

// npm run build: installs when needed and builds what changed.
import { buildWhenNeeded } from './building.mjs';
import { installWhenNeeded } from './install.mjs';

installWhenNeeded();
await buildWhenNeeded();

/** `npm run build`: client and server into dist/. */
import { provideBuild } from './build-output.mjs';
import { provideDependencies } from './dependencies.mjs';
import { checkNode } from './machine.mjs';
import { runScript } from './processes.mjs';

await runScript(async () => {
  checkNode();
  await provideDependencies();
  await provideBuild('server', 'client');
  console.log('Built into dist/.');
});

/** `npm run dev`: the product in watch mode. A change of a source is rebuilt; the server restarts, the browser needs a reload. */
import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { forgetBuild, provideBuild } from './build-output.mjs';
import { dataFolderPath } from './data-folder.mjs';
import { projectFolder, provideDependencies } from './dependencies.mjs';
import { provideMachine } from './machine.mjs';
import { endProcess, runScript, waitFor } from './processes.mjs';
import { Product } from './product.mjs';

const program = (name) => join(projectFolder, 'node_modules/.bin', name);

/** Each watcher has a process group of its own, so that one Ctrl+C ends all of them through us, in order. */
const watcher = (name, args) => spawn(program(name), args, { cwd: projectFolder, stdio: ['ignore', 'inherit', 'inherit'], detached: true });

await runScript(async () => {
  const asked = new Promise((resolve) => ['SIGINT', 'SIGTERM', 'SIGHUP'].forEach((name) => process.on(name, () => resolve(name))));
  await provideMachine('postgres');
  await provideDependencies();
  await provideBuild('server');
  const product = new Product(dataFolderPath());
  await product.claim();
  const running = [];
  try {
    await product.prepareDatabase();
    running.push(watcher('tsc', ['-p', 'tsconfig.server.json', '--watch', '--preserveWatchOutput']));
    forgetBuild('client'); // the development build takes its place
    running.push(watcher('ng', ['build', '--watch', '--configuration', 'development', '--progress=false']));
    await waitFor(() => existsSync(join(projectFolder, 'dist/client/index.html')), { seconds: 120 });
    running.push(product.launchServer(['--watch']), product.launchWorker(['--watch']));
    if (await waitFor(() => product.isReady(), { seconds: 60 })) {
      console.log(`\nSlantwise is ready:  ${product.address}   (${product.demo ? `demonstration password ${product.demoPassword}` : 'no demonstration accounts'})\n`);
    }
    await asked;
  } finally {
    await Promise.all(running.map((child) => endProcess(child.pid, 5)));
    await product.cluster.stop();
    product.release();
  }
});

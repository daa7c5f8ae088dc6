/** `npm run --silent token -- somebody@team.example`: prints a personal access token and nothing else. */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { DataFolder, dataFolderPath } from './data-folder.mjs';
import { Refusal, runScript } from './processes.mjs';
import { Product } from './product.mjs';

await runScript(async () => {
  const [email] = process.argv.slice(2);
  if (!email) throw new Refusal('Say whose token: npm run --silent token -- designer@merrow.example');
  const path = dataFolderPath();
  if (!existsSync(join(path, 'secret')) || new DataFolder(path).isNew) throw new Refusal(`There is nothing in ${path} yet: run "npm start" once first.`);
  const product = new Product(path);
  const wasRunning = await product.cluster.isRunning();
  if (!wasRunning) await product.cluster.start();
  try {
    process.stdout.write((await product.runEntry('token.js', [email])).output);
  } finally {
    if (!wasRunning) await product.cluster.stop();
  }
});

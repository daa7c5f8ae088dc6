/** Starts a throw-away PostgreSQL cluster, prints its superuser address, and stops it when standard input closes. */
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { openDataFolder } from '../../scripts/data-folder.mjs';
import { Cluster } from '../../scripts/postgres.mjs';

const folder = mkdtempSync(join(tmpdir(), 'slantwise-cluster-'));
chmodSync(folder, 0o711);
const cluster = new Cluster(openDataFolder(join(folder, 'data')), { throwAway: true });
await cluster.start();
process.stdout.write(`${cluster.superuserUrl}\n`);
process.stdin.resume();
process.stdin.on('end', async () => {
  await cluster.stop();
  rmSync(folder, { recursive: true, force: true });
  process.exit(0);
});

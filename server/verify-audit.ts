import { openHouse, runProgram } from './opened-house';

/** `verify-audit.js`: follows the audit chain of every team; names the first broken row of each and ends with exit code 1. */
void runProgram(async () => {
  const { house, close } = await openHouse({ ...process.env, LOG_LEVEL: 'silent' });
  try {
    const faults: string[] = [];
    for (const { id, name } of await house.teams.everyTeam()) {
      const brokenAt = await house.audit.verify(id);
      process.stdout.write(`${name}: ${brokenAt === null ? 'whole' : `broken at row ${brokenAt}`}\n`);
      if (brokenAt !== null) faults.push(name);
    }
    if (faults.length > 0) throw new Error(`The audit chain is broken: ${faults.join(', ')}`);
  } finally {
    await close();
  }
});

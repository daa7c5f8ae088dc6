import { emailAddress } from '../shared/contracts/common';
import { openHouse, runProgram } from './opened-house';

/** `first-team.js <team name> <address>`: makes a team and prints the link with which its first administrator joins. */
void runProgram(async () => {
  const [name, address] = process.argv.slice(2);
  if (name === undefined || address === undefined) throw new Error('Say the team and who runs it: first-team.js "Team name" somebody@team.example');
  const { house, close } = await openHouse({ ...process.env, LOG_LEVEL: 'silent' });
  try {
    process.stdout.write(`${await house.invitations.inviteFirst(name.trim(), emailAddress.parse(address))}\n`);
  } finally {
    await close();
  }
});

import { scopesOfRoles } from './accounts/token-scopes';
import { openHouse, runProgram } from './opened-house';

const TOKEN_DAYS = 90;

/** `token.js <address>`: prints a new personal token with every scope the person's roles allow, and nothing else. */
void runProgram(async () => {
  const email = process.argv[2]?.trim().toLowerCase();
  if (email === undefined) throw new Error('Say whose token: token.js designer@merrow.example');
  const { house, close } = await openHouse({ ...process.env, LOG_LEVEL: 'silent' });
  try {
    const owner = await house.ground.transactions.read(async (transaction) => {
      const person = await house.people.findByEmail(transaction, email);
      const [team] = person === null ? [] : await house.memberships.teamsOf(transaction, person.id);
      if (person === null || team === undefined) throw new Error(`Nobody with the address ${email} works in a team here.`);
      return { person, teamId: team.teamId, roles: team.roles };
    });
    const { secret } = await house.tokens.create(owner, { name: 'Command line', scopes: scopesOfRoles(owner.roles), days: TOKEN_DAYS });
    process.stdout.write(`${secret}\n`);
  } finally {
    await close();
  }
});

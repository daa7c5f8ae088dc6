import { NotFound } from '../http/problems';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { Team } from './team-entity';

export class TeamRepository {
  /** @throws NotFound */
  async require(transaction: Transaction, id: string): Promise<Team> {
    const team = await managerOf(transaction).getRepository(Team).findOneBy({ id });
    if (team === null) throw new NotFound('team');
    return team;
  }

  async findByName(transaction: Transaction, name: string): Promise<Team | null> {
    return managerOf(transaction).getRepository(Team).findOne({ where: { name }, order: { createdAt: 'ASC' } });
  }

  /** All of this installation: for programs on the server's machine, never for a request. */
  async all(transaction: Transaction): Promise<Team[]> {
    return managerOf(transaction).getRepository(Team).find({ order: { createdAt: 'ASC', id: 'ASC' } });
  }

  async insert(transaction: Transaction, team: Team): Promise<void> {
    await managerOf(transaction).getRepository(Team).insert(team);
  }

  async rename(transaction: Transaction, id: string, name: string): Promise<void> {
    await managerOf(transaction).getRepository(Team).update({ id }, { name });
  }
}

import { TeamScopedRepository } from '../database/team-scoped-repository';
import type { Transaction } from '../database/transaction-runner';
import { CellFamily } from './cell-family-entity';

export class CellFamilyRepository extends TeamScopedRepository<CellFamily> {
  constructor() {
    super(CellFamily, 'family');
  }

  async list(transaction: Transaction, teamId: string, text: string | undefined): Promise<CellFamily[]> {
    const query = this.rows(transaction, teamId, 'family').orderBy('family.name').addOrderBy('family.id');
    // position() takes the text as it is: no pattern signs to escape.
    if (text !== undefined && text !== '') query.andWhere('position(lower(:text) in lower(family.name)) > 0', { text });
    return query.getMany();
  }

  async byName(transaction: Transaction, teamId: string, name: string): Promise<CellFamily | null> {
    return this.store(transaction).findOneBy(this.ofTeam(teamId, { name }));
  }
}

import { randomUUID } from 'node:crypto';
import type { EditionDetail, ImportRequest, Inspection } from '../../shared/contracts/library';
import type { CellEdition, QualityReport } from '../../shared/model/cell-family';
import type { AuditService } from '../audit/audit-service';
import { canonicalJson } from '../../shared/model/canonical-json';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import type { Caller } from '../http/caller';
import { Conflict, InvalidInput, type Fault } from '../http/problems';
import { CellFamilyRepository } from './cell-family-repository';
import type { Edition } from './edition-entity';
import { EditionRepository } from './edition-repository';
import { sha256Of, type UploadReading, type UploadRequest } from './inspect-upload';
import type { InspectionRunner } from './inspection-runner';
import { KeptFileRepository } from './kept-file-repository';
import type { LibraryService } from './library-service';
import { writeResponseBlock } from './response-block';
import { unpackUpload, type NamedBytes } from './upload-archive';

type Actor = Pick<Caller, 'teamId'> & { readonly person: { readonly id: string } };

/** From files to an accepted edition, and from there to a published one or to nothing. */
export class ImportService {
  private readonly families = new CellFamilyRepository();
  private readonly editions = new EditionRepository();
  private readonly files = new KeptFileRepository();

  constructor(
    private readonly ground: Pick<Ground, 'transactions' | 'now'>,
    private readonly parts: { readonly library: LibraryService; readonly audit: AuditService; readonly runner: InspectionRunner },
  ) {}

  /** Stores nothing. */
  async inspect(files: readonly NamedBytes[], request: UploadRequest): Promise<Inspection> {
    const { inspection } = await this.parts.runner.run({ files: await unpacked(files), request });
    return inspection;
  }

  /**
   * Keeps the files and their reading as an accepted edition: of a new family, or of the one given.
   * @throws InvalidInput naming what keeps the files from being accepted
   */
  async accept(actor: Actor, familyId: string | null, files: readonly NamedBytes[], request: ImportRequest): Promise<EditionDetail> {
    const upload = await unpacked(files);
    const reading = await this.parts.runner.run({ files: upload, request: { mapping: request.mapping, description: request.description } });
    const { inspection, edition } = reading;
    if (edition === null || inspection.quality === null) throw new InvalidInput(faultsOf(reading));
    const quality = inspection.quality;
    return this.ground.transactions.run(async (transaction) => {
      const family = await this.familyFor(transaction, actor.teamId, { familyId, name: request.description.name });
      const row = this.rowOf(edition, { actor, familyId: family, request, quality, inspection, fileCount: upload.length });
      const stored = await this.editions.insert(transaction, actor.teamId, row);
      await this.files.keep(transaction, { teamId: actor.teamId, editionId: row.id }, upload.map(toNewFile));
      await this.parts.audit.record(transaction, {
        teamId: actor.teamId,
        personId: actor.person.id,
        action: 'edition.accepted',
        object: `edition:${row.id}`,
        detail: { family: request.description.name, hash: row.hash, files: upload.length, note: request.note },
      });
      return this.parts.library.detail(transaction, actor.teamId, stored);
    });
  }

  /** Gives the edition its number; from then on nothing changes it. */
  async publish(actor: Actor, editionId: string, note: string): Promise<EditionDetail> {
    return this.ground.transactions.run(async (transaction) => {
      const found = await this.editions.require(transaction, actor.teamId, editionId);
      await this.families.requireLocked(transaction, actor.teamId, found.familyId);
      const edition = await this.editions.requireLocked(transaction, actor.teamId, editionId);
      if (edition.number !== null) throw new Conflict(`This edition is published already, as number ${edition.number}.`);
      const number = await this.editions.nextNumber(transaction, actor.teamId, edition.familyId);
      const published = { number, publishNote: note, publishedBy: actor.person.id, publishedAt: this.ground.now() };
      await this.editions.update(transaction, actor.teamId, editionId, published);
      await this.parts.audit.record(transaction, {
        teamId: actor.teamId,
        personId: actor.person.id,
        action: 'edition.published',
        object: `edition:${editionId}`,
        detail: { number, hash: edition.hash, verdict: edition.verdict, note },
      });
      return this.parts.library.detail(transaction, actor.teamId, { ...edition, ...published });
    });
  }

  /** Drops an edition that was never published, with the files only it kept. */
  async discard(actor: Actor, editionId: string): Promise<void> {
    await this.ground.transactions.run(async (transaction) => {
      const edition = await this.editions.requireLocked(transaction, actor.teamId, editionId);
      if (edition.number !== null) throw new Conflict('A published edition stays: revisions may stand on it.');
      await this.editions.remove(transaction, actor.teamId, editionId);
      await this.editions.dropOrphanFiles(transaction, actor.teamId);
      const others = await this.editions.ofFamily(transaction, actor.teamId, edition.familyId);
      if (others.length === 0) await this.families.remove(transaction, actor.teamId, edition.familyId);
      await this.parts.audit.record(transaction, {
        teamId: actor.teamId,
        personId: actor.person.id,
        action: 'edition.discarded',
        object: `edition:${editionId}`,
        detail: { hash: edition.hash },
      });
    });
  }

  private async familyFor(transaction: Transaction, teamId: string, of: { familyId: string | null; name: string }): Promise<string> {
    if (of.familyId !== null) {
      const family = await this.families.require(transaction, teamId, of.familyId);
      if (family.name !== of.name) {
        throw new InvalidInput([{ pointer: '#/import/description/name', detail: `must stay ${JSON.stringify(family.name)}: the family keeps its name in every edition` }]);
      }
      return family.id;
    }
    if ((await this.families.byName(transaction, teamId, of.name)) !== null) {
      throw new Conflict(`There is a family named ${JSON.stringify(of.name)} already. Add an edition to it, or choose another name.`);
    }
    const family = { id: randomUUID(), name: of.name, createdAt: this.ground.now() };
    await this.families.insert(transaction, teamId, family);
    return family.id;
  }

  private rowOf(
    edition: CellEdition,
    of: { actor: Actor; familyId: string; request: ImportRequest; quality: QualityReport; inspection: Inspection; fileCount: number },
  ): Omit<Edition, 'teamId'> {
    const id = randomUUID();
    const responses = Buffer.from(writeResponseBlock(id, edition.responses));
    const { frequenciesHz, thetasRad, phisRad } = edition.responses;
    const { description, mapping, note } = of.request;
    const cells = [...edition.cells];
    // The block names the edition, so the hash of the numbers is taken without it: equal data, equal hash.
    const numbers = sha256Of(writeResponseBlock('', edition.responses));
    return {
      id,
      familyId: of.familyId,
      number: null,
      hash: sha256Of(Buffer.from(canonicalJson({ description, cells, mapping, numbers }))),
      description,
      cells,
      mapping,
      messages: [...of.inspection.messages, ...of.inspection.files.flatMap((file) => file.messages)],
      quality: of.quality,
      verdict: of.quality.verdict,
      cellCount: cells.length,
      fileCount: of.fileCount,
      fromGHz: (frequenciesHz[0] ?? 0) / 1e9,
      toGHz: (frequenciesHz.at(-1) ?? 0) / 1e9,
      thetasDeg: Array.from(thetasRad, degrees),
      phisDeg: Array.from(phisRad, degrees),
      responses,
      note,
      acceptedBy: of.actor.person.id,
      acceptedAt: this.ground.now(),
      publishNote: null,
      publishedBy: null,
      publishedAt: null,
    };
  }
}

/** Nodes are given in whole or half degrees; the way through radians must not leave 22.499999999999996. */
const degrees = (rad: number): number => Number(((rad * 180) / Math.PI).toFixed(9));

const toNewFile = (file: NamedBytes) => ({ name: file.name, sha256: sha256Of(file.bytes), body: Buffer.from(file.bytes) });

async function unpacked(files: readonly NamedBytes[]): Promise<NamedBytes[]> {
  if (files.length === 0) throw new InvalidInput([{ pointer: '#/files', detail: 'no file came with the request; send one or more in the field "files"' }]);
  return unpackUpload(files);
}

function faultsOf({ inspection }: UploadReading): Fault[] {
  const refused = inspection.files.flatMap((file) => file.messages.filter((message) => file.status === 'refused' && message.severity === 'error'));
  const messages = [...refused, ...inspection.refusals];
  if (messages.length === 0) return [{ pointer: '#/files', detail: 'the files hold no responses' }];
  return messages.slice(0, 100).map((message) => {
    const where = message.file === undefined ? '' : `${message.file}${message.line > 0 ? `, line ${message.line}` : ''}: `;
    const advice = message.suggestion === undefined ? '' : ` (${message.suggestion})`;
    return { pointer: '#/files', detail: `${where}${message.text}${advice}` };
  });
}


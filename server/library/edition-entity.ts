import { Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm';
import type { FileMessage, ImportMapping } from '../../shared/contracts/library';
import type { CellEntry, FamilyDescription, QualityReport, QualityVerdict } from '../../shared/model/cell-family';

/** One state of a family. Once published it is never changed: a trigger refuses it. */
@Entity({ name: 'edition' })
@Unique('edition_number', ['familyId', 'number'])
@Index('edition_team', ['teamId'])
export class Edition {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('uuid', { name: 'family_id' })
  familyId!: string;

  /** Null until published. */
  @Column('integer', { nullable: true })
  number!: number | null;

  /** SHA-256 over the canonical JSON of the description, the cells, the mapping and the hash of the responses. */
  @Column('text')
  hash!: string;

  @Column('jsonb')
  description!: FamilyDescription;

  @Column('jsonb')
  cells!: CellEntry[];

  @Column('jsonb')
  mapping!: ImportMapping;

  @Column('jsonb')
  messages!: FileMessage[];

  @Column('jsonb')
  quality!: QualityReport;

  @Column('text')
  verdict!: QualityVerdict;

  @Column('integer', { name: 'cell_count' })
  cellCount!: number;

  @Column('integer', { name: 'file_count' })
  fileCount!: number;

  @Column('double precision', { name: 'from_ghz' })
  fromGHz!: number;

  @Column('double precision', { name: 'to_ghz' })
  toGHz!: number;

  @Column('double precision', { name: 'thetas_deg', array: true })
  thetasDeg!: number[];

  @Column('double precision', { name: 'phis_deg', array: true })
  phisDeg!: number[];

  /** The response table as a binary block; read only where it is asked for. */
  @Column('bytea', { select: false })
  responses!: Buffer;

  @Column('text')
  note!: string;

  @Column('uuid', { name: 'accepted_by' })
  acceptedBy!: string;

  @Column('timestamptz', { name: 'accepted_at' })
  acceptedAt!: Date;

  @Column('text', { name: 'publish_note', nullable: true })
  publishNote!: string | null;

  @Column('uuid', { name: 'published_by', nullable: true })
  publishedBy!: string | null;

  @Column('timestamptz', { name: 'published_at', nullable: true })
  publishedAt!: Date | null;
}

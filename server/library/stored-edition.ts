import type { FileMessage, ImportMapping } from '../../shared/contracts/library';
import type { CellEntry, FamilyDescription, QualityReport, QualityVerdict } from '../../shared/model/cell-family';

/** An edition as it is stored, without its responses. */
export interface StoredEdition {
  readonly id: string;
  readonly teamId: string;
  readonly familyId: string;
  readonly number: number | null;
  readonly hash: string;
  readonly description: FamilyDescription;
  readonly cells: CellEntry[];
  readonly mapping: ImportMapping;
  readonly messages: FileMessage[];
  readonly quality: QualityReport;
  readonly verdict: QualityVerdict;
  readonly cellCount: number;
  readonly fileCount: number;
  readonly fromGHz: number;
  readonly toGHz: number;
  readonly thetasDeg: number[];
  readonly phisDeg: number[];
  readonly note: string;
  readonly acceptedBy: string;
  readonly acceptedAt: Date;
  readonly publishNote: string | null;
  readonly publishedBy: string | null;
  readonly publishedAt: Date | null;
}

export interface StoredFamily {
  readonly id: string;
  readonly name: string;
}

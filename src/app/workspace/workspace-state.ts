import { InjectionToken } from '@angular/core';
import type { Signal } from '@angular/core';
import type { Problem } from '../../../shared/contracts/common';
import type { EditionDetail } from '../../../shared/contracts/library';
import type { CutRequest } from '../../../shared/contracts/predictions';
import type { PanelDetail } from '../../../shared/contracts/projects';
import type { CellResponseTable } from '../../../shared/model/cell-family';
import type { DesignDocument } from '../../../shared/model/design-document';
import type { LivePrediction } from './live-prediction-data';
import type { SaveProgress } from './save-progress';

export type EditionInUse = EditionDetail & { readonly responses: CellResponseTable };

export interface ChangeOptions {
  /** Changes with the same key within a second become one undo step, such as a steering drag. */
  readonly mergeKey?: string;
}

/** What every sheet of the workspace reads and changes. Provided by the workspace page. */
export interface WorkspaceState {
  readonly panel: Signal<PanelDetail | null>;
  /** The draft as it stands on the screen, saved or not. */
  readonly design: Signal<DesignDocument>;
  /** The last good prediction; `stale` says whether it is of an older design. */
  readonly prediction: Signal<LivePrediction | null>;
  /** Of the latest revision, for trends and overlays. */
  readonly parentPrediction: Signal<LivePrediction | null>;
  readonly edition: Signal<EditionInUse | null>;
  /** Why the edition that the design names cannot be shown. */
  readonly editionFailure?: Signal<string | null>;
  readonly stale: Signal<boolean>;
  /** Why the design on the screen has no prediction. */
  readonly failure: Signal<Problem | null>;
  readonly canEdit: Signal<boolean>;
  /** Why nothing can be changed, or null when it can. */
  readonly viewOnlyReason: Signal<string | null>;
  readonly saveState: Signal<SaveProgress>;

  /** One named undo step. `next` gets the design as it stands; returning the same object changes nothing. */
  change(name: string, next: (design: DesignDocument) => DesignDocument, options?: ChangeOptions): void;
  undo(): void;
  redo(): void;
  /** Cuts wanted next to those along and across the beam. */
  requestCuts(cuts: readonly CutRequest[]): void;
  /** Asks for a u-v map with so many samples per side; 0 asks for none. */
  requestUv(size: number): void;
  /** Asks for a harmonic of time-modulated cells; null for the steered one. */
  requestHarmonic?(order: number | null): void;
}

export const WORKSPACE_STATE = new InjectionToken<WorkspaceState>('workspace state');

import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import type { Inspection } from '../../../shared/contracts/library';
import { LibraryDesk } from '../api/library-desk';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { SessionStore } from '../session/session-store';
import { EmptyState } from '../ui/empty-state';
import { FaultNote } from '../ui/fault-note';
import { LinePlot } from '../ui/plots/line-plot';
import { SheetFrame } from '../ui/sheet-frame';
import { ViewTitle } from '../ui/view-title';
import { DESCRIPTION_FIELDS } from './description-form-values';
import { FileDrop } from './file-drop';
import { FileFindings } from './file-findings';
import { ImportJob } from './import-job';
import { previewFigure } from './preview-figure';
import { QualityList } from './quality-list';

/** Detect, preview, map, describe, validate, accept with a note: nothing is stored before the last step. */
@Component({
  selector: 'slant-import-page',
  imports: [EmptyState, FaultNote, FileDrop, FileFindings, LinePlot, QualityList, RouterLink, SheetFrame, ViewTitle],
  providers: [ImportJob],
  templateUrl: './import-page.html',
  styleUrls: ['./library-page.scss', './import-page.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPage {
  private readonly desk = inject(LibraryDesk);
  private readonly router = inject(Router);
  protected readonly job = inject(ImportJob);
  protected readonly isLab = inject(SessionStore).hasRole('lab');
  /** Set when a family gets another edition. */
  readonly family = input<string>();
  protected readonly familyName = signal<string | null>(null);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly noteMissing = signal(false);
  protected readonly fields = DESCRIPTION_FIELDS;
  protected readonly descriptionFaults = computed<Readonly<Record<string, string>>>(() => {
    const described = this.job.described();
    return described.kind === 'incomplete' ? described.faults : {};
  });
  protected readonly missing = computed(() => Object.keys(this.descriptionFaults()).length);
  protected readonly otherFaults = computed(() => Object.entries(this.descriptionFaults()).filter(([path]) => !DESCRIPTION_FIELDS.some((field) => field.path === path)));
  protected readonly figures = computed(() => previewFigure(this.job.inspection()?.preview ?? null));
  protected readonly progressText = computed(() => {
    const progress = this.job.progress();
    if (progress.kind === 'idle') return null;
    return progress.kind === 'sending' ? `Sending, ${Math.round(progress.share * 100)} %` : 'The server reads the files';
  });
  protected readonly share = computed(() => {
    const progress = this.job.progress();
    return progress.kind === 'sending' ? progress.share : 1;
  });

  constructor() {
    effect(() => {
      const id = this.family();
      if (id !== undefined && id !== '') void this.prefill(id);
    });
  }

  private async prefill(familyId: string): Promise<void> {
    try {
      const family = await this.desk.family(familyId);
      this.familyName.set(family.name);
      this.job.prefill(family.description);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }

  protected foundText({ detected }: Inspection): string {
    const band = detected.frequencyRangeGHz;
    const parts = [
      `${detected.cellCount} cells`,
      detected.portCount === 2 ? 'two ports' : 'one port',
      ...(band === null ? [] : [`${band.from} to ${band.to} GHz in ${detected.frequencyCount} points`]),
      `θ ${detected.thetasDeg.join(', ')}°`,
      ...(detected.phisDeg.length > 1 ? [`φ ${detected.phisDeg.join(', ')}°`] : []),
      `parameters: ${detected.parameterNames.join(', ') || 'none found'}`,
    ];
    return parts.join(' · ');
  }

  protected accept(note: string): void {
    this.noteMissing.set(note.trim() === '');
    if (note.trim() === '') return;
    this.job.accept(note.trim(), this.family() ?? null, (edition) => void this.router.navigate(['/library/editions', edition.id]));
  }
}

import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { prepareEdition } from '../../../shared/antenna/prepare-edition';
import type { CurvePolarisation } from '../../../shared/antenna/response-curve';
import type { EditionUse, KeptFile } from '../../../shared/contracts/library';
import { LibraryClient } from '../api/library-client';
import type { EditionWithResponses } from '../api/library-client';
import { LibraryDesk } from '../api/library-desk';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { SessionStore } from '../session/session-store';
import { ChoiceTabs } from '../ui/choice-tabs';
import { Confirm } from '../ui/confirm';
import { FaultNote } from '../ui/fault-note';
import { AskName } from '../ui/name-dialog';
import { LinePlot } from '../ui/plots/line-plot';
import { SheetFrame } from '../ui/sheet-frame';
import { TitleBlock } from '../ui/title-block';
import { ViewTitle } from '../ui/view-title';
import { CellDrawing } from './cell-drawing';
import { DescriptionList } from './description-list';
import { curvePair } from './edition-curves';
import type { CurveAxis } from './edition-curves';
import { angleText, bandText, editionText } from './family-text';
import { QualityList } from './quality-list';
import { verdictMark, verdictText } from './verdict-words';

/** One edition: its cells, curves, checks, description, files and uses; the lab publishes or discards it here. */
@Component({
  selector: 'slant-edition-page',
  imports: [CellDrawing, ChoiceTabs, DescriptionList, FaultNote, LinePlot, QualityList, RouterLink, SheetFrame, TitleBlock, ViewTitle],
  templateUrl: './edition-page.html',
  styleUrls: ['./library-page.scss', './edition-page.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionPage {
  private readonly client = inject(LibraryClient);
  private readonly desk = inject(LibraryDesk);
  private readonly session = inject(SessionStore);
  private readonly router = inject(Router);
  private readonly confirm = inject(Confirm);
  private readonly names = inject(AskName);
  readonly editionId = input.required<string>();
  protected readonly edition = signal<EditionWithResponses | null>(null);
  protected readonly uses = signal<readonly EditionUse[]>([]);
  protected readonly files = signal<readonly KeptFile[]>([]);
  protected readonly nextFiles = signal<string | null>(null);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly axis = signal<CurveAxis>('parameter');
  protected readonly cellIndex = signal(0);
  protected readonly frequencyIndex = signal(0);
  protected readonly theta = signal(0);
  protected readonly phi = signal(0);
  protected readonly port = signal<CurvePolarisation>('first');
  protected readonly canEdit = computed(() => this.session.hasRole('lab'));
  private readonly prepared = computed(() => {
    const edition = this.edition();
    return edition === null ? null : prepareEdition(edition);
  });
  protected readonly frequencies = computed(() => Array.from(this.edition()?.responses.frequenciesHz ?? [], (hz) => hz / 1e9));
  protected readonly curves = computed(() => {
    const prepared = this.prepared();
    if (prepared === null) return null;
    const fixed = { cellIndex: this.cellIndex(), frequencyGHz: this.frequencies()[this.frequencyIndex()], incidenceDeg: this.theta(), azimuthDeg: this.phi(), polarisation: this.port() };
    return curvePair(prepared, { ...fixed, axis: this.axis() });
  });
  protected readonly axes = computed(() => {
    const axes: { id: CurveAxis; label: string }[] = [{ id: 'parameter', label: 'Against the parameter' }, { id: 'frequency', label: 'Against frequency' }];
    if ((this.edition()?.thetasDeg.length ?? 0) > 1) axes.push({ id: 'incidence', label: 'Against incidence' });
    return axes;
  });
  protected readonly ports = computed(() => {
    const ports = this.edition()?.description.ports;
    if (ports === 'te-and-tm') return [{ id: 'first', label: 'TE' }, { id: 'second', label: 'TM' }];
    return ports === 'x-and-y' ? [{ id: 'first', label: 'x' }, { id: 'second', label: 'y' }] : [];
  });
  protected readonly titleBlock = computed(() => {
    const edition = this.edition();
    if (edition === null) return [];
    return [
      [{ label: 'Family', value: edition.familyName }, { label: 'Edition', value: editionText(edition) }],
      [
        { label: 'Accepted by', value: edition.acceptedBy.name },
        { label: 'Published by', value: edition.publishedBy?.name ?? '—' },
        { label: 'Date', value: (edition.publishedAt ?? edition.acceptedAt).slice(0, 10), figure: true },
        { label: 'Hash', value: edition.hash.slice(0, 12), figure: true },
      ],
    ];
  });
  protected readonly bandText = bandText;
  protected readonly angleText = angleText;
  protected readonly editionText = editionText;
  protected readonly verdictMark = verdictMark;
  protected readonly verdictText = verdictText;

  constructor() {
    effect(() => void this.load(this.editionId()));
  }

  private async load(id: string): Promise<void> {
    const outcome = await this.client.edition(id);
    if (outcome.kind === 'missing') {
      this.fault.set({ detail: outcome.reason, fields: {} });
      return;
    }
    this.edition.set(outcome.edition);
    // The middle of the family, where its curve is steepest and a cell shows its form.
    this.cellIndex.set(Math.floor(outcome.edition.cells.length / 2));
    const design = outcome.edition.description.designFrequencyGHz;
    const distances = this.frequencies().map((value) => Math.abs(value - design));
    this.frequencyIndex.set(distances.indexOf(Math.min(...distances)));
    await this.attempt(async () => {
      this.uses.set(await this.desk.uses(id));
      await this.readFiles(null);
    });
  }

  protected async readFiles(after: string | null): Promise<void> {
    const page = await this.desk.files(this.editionId(), after);
    this.files.update((files) => (after === null ? page.items : [...files, ...page.items]));
    this.nextFiles.set(page.next);
  }

  protected chooseAxis(id: string): void {
    const axis = this.axes().find((choice) => choice.id === id);
    if (axis !== undefined) this.axis.set(axis.id);
  }

  protected choosePort(id: string): void {
    this.port.set(id === 'second' ? 'second' : 'first');
  }

  protected pickSample(at: number): void {
    const order = this.curves()?.cellIndex;
    if (order) this.cellIndex.set(order[at]);
    else if (this.axis() === 'frequency') this.frequencyIndex.set(at);
  }

  protected async publish(): Promise<void> {
    const note = await this.names.ask({ title: 'Publish the edition', label: 'Note: what designers should know', deed: 'Publish', hint: 'It gets the next number and never changes again.' });
    if (note === undefined) return;
    await this.attempt(async () => {
      const published = await this.desk.publish(this.editionId(), note);
      this.edition.update((edition) => (edition === null ? null : { ...edition, ...published }));
    });
  }

  protected async discard(): Promise<void> {
    const sure = await this.confirm.ask({ title: 'Discard the edition?', text: 'The reading and the files only it keeps are removed. This cannot be undone.', deed: 'Discard', final: true });
    if (!sure) return;
    await this.attempt(async () => {
      await this.desk.discard(this.editionId());
      await this.router.navigateByUrl('/library');
    });
  }

  private async attempt(work: () => Promise<void>): Promise<void> {
    try {
      await work();
      this.fault.set(null);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }
}

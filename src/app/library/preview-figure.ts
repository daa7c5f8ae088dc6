import type { Inspection } from '../../../shared/contracts/library';
import type { LineFigure } from '../ui/plots/line-figure';

/** The curves of the first cells against frequency, for a look before anything is accepted. */
export function previewFigure(preview: Inspection['preview']): { readonly phase: LineFigure; readonly magnitude: LineFigure } | null {
  if (preview === null || preview.cells.length === 0 || preview.frequenciesGHz.length < 2) return null;
  const frequencies = preview.frequenciesGHz;
  const x = { title: 'frequency, GHz', from: frequencies[0], to: frequencies[frequencies.length - 1] };
  const lines = (pick: 'phaseDeg' | 'magnitudeDb'): LineFigure['lines'] => preview.cells.map((cell) => ({ label: cell.cellId, x: frequencies, y: cell[pick], ink: 'ink' }));
  const range = (pick: 'phaseDeg' | 'magnitudeDb', least: number): { from: number; to: number } => {
    const all = preview.cells.flatMap((cell) => cell[pick]);
    const [low, high] = [Math.min(...all), Math.max(...all)];
    const room = Math.max(least, (high - low) * 0.05);
    return { from: low - room, to: high + room };
  };
  return {
    phase: { title: `Phase of ${preview.cells.length} cells`, x, y: { title: 'unwrapped phase, °', ...range('phaseDeg', 5) }, lines: lines('phaseDeg') },
    magnitude: { title: `Magnitude of ${preview.cells.length} cells`, x, y: { title: 'magnitude, dB', ...range('magnitudeDb', 0.05) }, lines: lines('magnitudeDb'), levels: [{ at: 0, label: 'all reflected' }] },
  };
}

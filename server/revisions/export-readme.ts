import type { DesignDocument } from '../../shared/model/design-document';
import type { RevisionHeader } from '../../shared/contracts/projects';
import type { Warning } from '../../shared/model/figures';

export interface ReadmeFacts {
  readonly header: RevisionHeader;
  readonly projectName: string;
  readonly panelName: string;
  readonly invented: boolean;
  readonly edition: { readonly familyName: string; readonly number: number; readonly provenance: string; readonly limits: string } | null;
  readonly warnings: readonly Warning[];
  readonly design: Pick<DesignDocument, 'prediction'>;
  readonly engineVersion: string;
  readonly productVersion: string;
}

const WIDTH = 78;

/** What the files are, their units and conventions, and what to beware of; plain text for whoever opens the archive. */
export function exportReadme(facts: ReadmeFacts): string {
  const { header, projectName, panelName, productVersion, engineVersion } = facts;
  return [
    `${projectName}: ${panelName}, revision ${header.number}`,
    '',
    ...(facts.invented ? [...wrapped('INVENTED: this project is a demonstration. It describes no real installation.'), ''] : []),
    ...wrapped(`Frozen ${header.createdAt} by ${header.author.name}: ${header.message}`),
    ...wrapped(`Content hash ${header.hash}. It is the SHA-256 of design.json as it stands here, without a line end.`),
    `Written by Slantwise ${productVersion}, prediction engine ${engineVersion}.`,
    '',
    ...FILES,
    '',
    'Units and conventions',
    ...CONVENTIONS.flatMap((line) => wrapped(line, '- ')),
    '',
    'Cautions',
    ...cautions(facts).flatMap((line) => wrapped(line, '- ')),
    '',
  ].join('\n');
}

const FILES = [
  'Files',
  '  cells.csv       one row for each cell: place, cell, its dimensions, phases',
  '  figures.csv     every predicted figure, then the requirement line by line',
  '  cut_along.csv   pattern in the plane of the beam and the z axis',
  '  cut_across.csv  pattern on the great circle across the beam',
  '  design.json     the frozen design document with its cell edition',
  '  manifest.json   what all this is, for programs',
  '  SHA256SUMS      check with: sha256sum --strict -c SHA256SUMS',
];

const CONVENTIONS = [
  'Lengths in mm, frequencies in GHz, angles and phases in degrees, levels in dB or dBi; decimal points, comma separated.',
  'The panel lies in z = 0 with its centre at the origin; +z is the side the beams are on. theta from +z, phi from +x towards +y. Columns count from 0 at the lowest x, rows from 0 at the lowest y; cells.csv goes row by row from the lowest y.',
  'Time exp(+j omega t), waves exp(-j k.r): a delay is a falling phase. Target and achieved phases lie in [0, 360), the error is achieved minus target in (-180, 180], all at the design frequency.',
  'amplitude is that of the incident wave at the cell, response_db what the cell gives back of it, incidence_deg the angle from the normal at which the wave arrives and incidence_azimuth_deg the azimuth it travels in.',
  'In the cuts the angle is 0 in the wanted direction: along, it grows away from z; across, towards rising phi. -200 dBi is the floor: no radiation.',
];

/** For whoever builds, mounts or lights the panel, whatever the design. */
const GENERAL_CAUTIONS = [
  'Results depend on the measured cells, their angle and frequency range, and the stated model; verify by measurement before use.',
  'Observe the exposure limits of your jurisdiction. Do not enter the beam or the feed–panel space while transmitting. Interlock, barrier and sign as the site\'s RF safety officer directs.',
  'A range test is a transmission. Confirm authorisation for frequency, power, place and dates.',
  'Mounting, wind, ice, seismic, lightning and grounding design must follow local codes and be done or checked by a licensed professional.',
];

/** Which model predicted, and what it leaves out. */
function modelCaution({ prediction }: ReadmeFacts['design']): string {
  const leftOut = 'no scattering from edges, struts or the horn';
  if (prediction.model !== 'vector') return `Everything here is predicted by a scalar model of independent cells; nothing was measured on this panel. There is no cross-polar field in it, ${leftOut}.`;
  const form = `${prediction.reradiation ?? 'power-wave'} re-radiation, cell factor ${prediction.cellFactor ?? 'none'}`;
  return `Everything here is predicted by a vector model of independent cells (${form}); nothing was measured on this panel. Gain and beam figures are of the co-polar field; the cuts hold the cross-polar one too. There is ${leftOut} in it.`;
}

function cautions({ edition, warnings, invented, design }: ReadmeFacts): string[] {
  return [
    modelCaution(design),
    'This archive is no release for fabrication: it says nothing of who reviewed the revision.',
    ...(edition === null
      ? ['The cells are ideal or a what-if table: they have no geometry and cannot be made as they stand.']
      : [`The cells come from "${edition.familyName}", edition ${edition.number}: ${edition.provenance}. ${edition.limits}`.trim()]),
    ...(invented ? ['Names, places and requirements are invented.'] : []),
    ...GENERAL_CAUTIONS,
    ...warnings.map(({ message }) => message),
  ];
}

/** Lines of at most 78 characters; `mark` begins the first, blanks of its length the others. */
function wrapped(text: string, mark = ''): string[] {
  const lines: string[] = [];
  let line = mark;
  for (const word of text.split(/\s+/)) {
    const indent = ' '.repeat(mark.length);
    const longer = line === mark || line === indent ? `${line}${word}` : `${line} ${word}`;
    if (longer.length > WIDTH && line.trim() !== mark.trim()) {
      lines.push(line);
      line = `${indent}${word}`;
    } else line = longer;
  }
  return [...lines, line];
}

import type { Figure, Figures } from '../../model/figures';
import type { Link } from '../../model/transmission';
import { powerRatioToDb } from '../../units/decibels';
import type { IlluminatedState } from '../illuminated-state';
import { isNumber, noFigure } from '../no-figure';
import { largestDimensionM } from '../outline';
import { freeSpaceLossDb, receivedPowerDbm } from './free-space';
import { bistaticCrossSectionM2, relayedPowerDbm } from './relay-panel';

type LinkResult = NonNullable<Figures['link']>;

const NO_TRANSMITTER = noFigure('no-transmitter', 'a link needs the power of the transmitter');

/** The link of the requirement, towards its first wanted beam. */
export function linkFigures(state: IlluminatedState, gainAtBeamDbi: Figure): LinkResult {
  const { link } = state.placed.design.requirement;
  if (link === undefined) return noFigure('no-link', 'the requirement has no link');
  return link.kind === 'hop' ? hopFigures(state, link, gainAtBeamDbi) : relayFigures(state, link);
}

function farFieldFromM({ placed, wavelengthM }: IlluminatedState): number {
  return (2 * largestDimensionM(placed.si.panel.outline) ** 2) / wavelengthM;
}

function hopFigures(state: IlluminatedState, link: Extract<Link, { kind: 'hop' }>, gainAtBeamDbi: Figure): LinkResult {
  const { illumination, requirement } = state.placed.design;
  if (illumination.kind === 'plane-wave') return noFigure('plane-wave', 'a panel lit by a plane wave sends nothing of its own: choose a link over the panel');
  const { distanceM, farGainDbi, excessLossDb = 0 } = link;
  const loss = freeSpaceLossDb(state.frequencyHz, distanceM);
  const fromM = farFieldFromM(state);
  const received = (): Figure => {
    if (requirement.transmitter === undefined) return NO_TRANSMITTER;
    if (distanceM < fromM) return noFigure('near-field', `the far antenna stands within the far-field distance of the panel, ${fromM.toPrecision(4)} m, where the formula does not hold`);
    if (!isNumber(gainAtBeamDbi)) return gainAtBeamDbi;
    const { powerW, lossDb = 0 } = requirement.transmitter;
    return receivedPowerDbm({ powerW, gainsDbi: [gainAtBeamDbi, farGainDbi], lossesDb: [lossDb, loss, excessLossDb] });
  };
  return { receivedDbm: received(), freeSpaceLossDb: [loss], farFieldFromM: fromM };
}

function relayFigures(state: IlluminatedState, link: Extract<Link, { kind: 'relay' }>): LinkResult {
  const { placed, responses, wavenumber, wavelengthM, frequencyHz } = state;
  const { si, lattice, design } = placed;
  if (si.illumination.kind !== 'plane-wave') return noFigure('own-feed', 'the panel has a feed of its own: choose a hop from the panel, or light it by a plane wave');
  const { incomingDistanceM, outgoingDistanceM, sourceGainDbi, farGainDbi, excessLossDb = 0 } = link;
  const cells = { xM: lattice.xM, yM: lattice.yM, cellAreaM2: lattice.cellAreaM2, ...responses };
  const crossSectionM2 = bistaticCrossSectionM2(cells, { source: si.illumination.source, receiver: si.beams[0].direction, incomingDistanceM, outgoingDistanceM, wavenumber });
  const { transmitter } = design.requirement;
  const received = (): Figure => {
    if (transmitter === undefined) return NO_TRANSMITTER;
    if (crossSectionM2 <= 0) return noFigure('nothing-returned', 'the panel sends nothing towards the receiver');
    const budget = { powerW: transmitter.powerW, lossDb: (transmitter.lossDb ?? 0) + excessLossDb, sourceGainDbi, farGainDbi, frequencyHz, incomingDistanceM, outgoingDistanceM, crossSectionM2 };
    return relayedPowerDbm(budget, wavelengthM);
  };
  return {
    receivedDbm: received(),
    freeSpaceLossDb: [freeSpaceLossDb(frequencyHz, incomingDistanceM), freeSpaceLossDb(frequencyHz, outgoingDistanceM)],
    crossSectionDbsm: crossSectionM2 > 0 ? powerRatioToDb(crossSectionM2) : noFigure('nothing-returned', 'the panel sends nothing towards the receiver'),
    farFieldFromM: farFieldFromM(state),
  };
}

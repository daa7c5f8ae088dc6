import { exposureLimits } from '../../../shared/antenna/exposure/exposure-limits';
import { densityOnAxisWPerM2, distanceToLimitM, exposureZones, farFieldDensityWPerM2, type RadiatingAperture } from '../../../shared/antenna/exposure/aperture-exposure';
import { eirpDensityOffsetDb, freeSpaceLossDb, receivedPowerDbm } from '../../../shared/antenna/link/free-space';
import { gainOverTemperatureDbPerK, noisePowerDbm, systemTemperatureK } from '../../../shared/antenna/link/receiver-noise';
import { bistaticCrossSectionM2, plateCrossSectionM2, relayedPowerDbm } from '../../../shared/antenna/link/relay-panel';
import { illuminatedState } from '../../../shared/antenna/illuminated-state';
import { placeCells } from '../../../shared/antenna/place-cells';
import { predictPlaced } from '../../../shared/antenna/predict-design';
import { bestFeedExponent, feedEfficiency, feedExponentOfHalfWidth, subtendedHalfAngleRad } from '../../../shared/antenna/sizing/feed-efficiency';
import { degFromRad, radFromDeg } from '../../../shared/units/angles';
import { powerRatioToDb } from '../../../shared/units/decibels';
import { SPEED_OF_LIGHT_M_PER_S } from '../../../shared/units/constants';
import { directionOf } from '../../../shared/waves/conventions';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { testDesign } from '../test-designs';

const relative = (check: PublishedCheck, expected: number): number => Math.abs(expected) * toleranceOf(check, 'rel');

function compareRelative(check: PublishedCheck, name: string, got: number): void {
  const expected = numberIn(check.expected, name);
  expectWithin({ quantity: name, unit: '', got, expected, tolerance: relative(check, expected) });
}

function roundAperture(inputs: PublishedCheck['inputs']): RadiatingAperture {
  const [diameterM, frequencyGHz] = [numberIn(inputs, 'D_m'), numberIn(inputs, 'f_GHz')];
  const wavelengthM = SPEED_OF_LIGHT_M_PER_S / (frequencyGHz * 1e9);
  const gainRatio = numberIn(inputs, 'aperture_efficiency') * (Math.PI * (diameterM / wavelengthM)) ** 2;
  return { powerW: numberIn(inputs, 'P_W'), areaM2: (Math.PI / 4) * diameterM ** 2, largestDimensionM: diameterM, gainRatio, wavelengthM };
}

export function compareAperture(check: PublishedCheck): void {
  const aperture = roundAperture(check.inputs);
  const zones = exposureZones(aperture);
  const known: Readonly<Record<string, () => number>> = {
    S_surface: () => zones.surfaceWPerM2,
    R_nf_m: () => zones.nearFieldEndM,
    S_nf: () => zones.nearFieldWPerM2,
    R_ff_m: () => zones.farFieldFromM,
    S_at_Rff_far: () => farFieldDensityWPerM2(aperture.powerW, aperture.gainRatio, zones.farFieldFromM),
    // Just inside, where the transition formula still holds.
    S_at_Rff_transition: () => densityOnAxisWPerM2(aperture, zones.farFieldFromM * (1 - 1e-12)),
    compliance_m_at_10: () => distanceToLimitM(aperture, 10),
    compliance_m_at_50: () => distanceToLimitM(aperture, 50),
    gain_dBi: () => powerRatioToDb(aperture.gainRatio),
    far_formula_m_at_50: () => Math.sqrt(farFieldDensityWPerM2(aperture.powerW, aperture.gainRatio, 1) / 50),
  };
  for (const name of Object.keys(check.expected)) compareRelative(check, name, known[name]());
}

const limitOf = (limit: ReturnType<typeof exposureLimits>['fccPublic']): { limitWPerM2: number; averagingMin: number } => {
  if ('reason' in limit) throw new Error(String(limit.reason));
  return limit as { limitWPerM2: number; averagingMin: number };
};

/** Fields of the two-hop case as it is published. */
function relayCase(inputs: PublishedCheck['inputs']) {
  const [incidence, scatter] = [numbersIn(inputs, 'incidence_deg'), numbersIn(inputs, 'scatter_deg')];
  const design = testDesign({ frequencyGHz: numberIn(inputs, 'f_GHz'), periodMm: numberIn(inputs, 'period_mm'), columns: numberIn(inputs, 'nx'), rows: numberIn(inputs, 'ny') });
  const link = {
    kind: 'relay' as const,
    incomingDistanceM: numberIn(inputs, 'd1_m'),
    outgoingDistanceM: numberIn(inputs, 'd2_m'),
    sourceGainDbi: numberIn(inputs, 'G_t_dBi'),
    farGainDbi: numberIn(inputs, 'G_r_dBi'),
  };
  return {
    ...design,
    illumination: { kind: 'plane-wave' as const, thetaDeg: incidence[0], phiDeg: incidence[1], polarisation: 'x' as const },
    requirement: { ...design.requirement, beams: [{ thetaDeg: scatter[0], phiDeg: scatter[1] }], transmitter: { powerW: 10 ** (numberIn(inputs, 'P_t_dBm') / 10 - 3) }, link },
  };
}

function compareRelay(check: PublishedCheck): void {
  const design = relayCase(check.inputs);
  const placed = placeCells(design);
  const { responses, wavenumber, wavelengthM, frequencyHz } = illuminatedState(placed);
  const { lattice } = placed;
  const cells = { xM: lattice.xM, yM: lattice.yM, cellAreaM2: lattice.cellAreaM2, ...responses };
  const { link, transmitter, beams } = design.requirement;
  const source = directionOf(radFromDeg(design.illumination.thetaDeg), radFromDeg(design.illumination.phiDeg));
  const plane = { incomingDistanceM: Infinity, outgoingDistanceM: Infinity };
  const towards = (thetaDeg: number) => directionOf(radFromDeg(thetaDeg), radFromDeg(beams[0].phiDeg));
  const powerOver = (crossSectionM2: number): number => relayedPowerDbm({ ...link, powerW: transmitter.powerW, lossDb: 0, frequencyHz, crossSectionM2 }, wavelengthM);
  const wanted = bistaticCrossSectionM2(cells, { source, receiver: towards(beams[0].thetaDeg), wavenumber, ...plane });
  const off = bistaticCrossSectionM2(cells, { source, receiver: towards(beams[0].thetaDeg + numberIn(check.inputs, 'receiver_off_theta_deg')), wavenumber, ...plane });
  const areaM2 = lattice.count * lattice.cellAreaM2;
  const hopGain = (cosine: number): number => powerRatioToDb((4 * Math.PI * areaM2 * cosine) / wavelengthM ** 2);
  const losses = [link.incomingDistanceM, link.outgoingDistanceM].map((distance) => freeSpaceLossDb(frequencyHz, distance));
  const gains = [link.sourceGainDbi, link.farGainDbi, hopGain(source.w), hopGain(towards(beams[0].thetaDeg).w)];
  const told = predictPlaced(placed, { include: {} }).figures.link;
  if (told === undefined || !('farFieldFromM' in told)) throw new Error('no link among the figures');
  const got: Readonly<Record<string, number>> = {
    sigma_dBsm: powerRatioToDb(wanted),
    received_dBm: powerOver(wanted),
    two_friis_hops_dBm: receivedPowerDbm({ powerW: transmitter.powerW, gainsDbi: gains, lossesDb: losses }),
    received_with_receiver_off_dBm: powerOver(off),
    panel_far_field_m: Number(told.farFieldFromM),
    received_with_spherical_distances_dBm: Number(told.receivedDbm),
  };
  for (const name of Object.keys(check.expected)) expectWithin({ quantity: name, unit: '', got: got[name], expected: numberIn(check.expected, name), tolerance: toleranceOf(check, 'dB') });
}

export const linkChecks: CheckTable = {
  'link-01': (check) => {
    const cases = check.inputs['cases'] as { f_GHz: number; d_km?: number; d_m?: number }[];
    const got = cases.map(({ f_GHz: ghz, d_km: km, d_m: m }) => freeSpaceLossDb(ghz * 1e9, m ?? (km ?? 0) * 1000));
    expectWithin({ quantity: 'loss', unit: 'dB', got, expected: numbersIn(check.expected, 'fspl_dB'), tolerance: toleranceOf(check, 'dB') });
    expectWithin({ quantity: 'constant', unit: 'dB', got: freeSpaceLossDb(1e9, 1000), expected: numberIn(check.expected, 'constant_GHz_km'), tolerance: toleranceOf(check, 'dB') });
  },
  'link-02': (check) => {
    const chain = {
      antennaTemperatureK: numberIn(check.inputs, 'T_antenna_K'),
      lineLossDb: numberIn(check.inputs, 'line_loss_dB'),
      lineTemperatureK: numberIn(check.inputs, 'T_line_K'),
      noiseFigureDb: numberIn(check.inputs, 'NF_dB'),
    };
    expectWithin({ quantity: 'temperature', unit: 'K', got: systemTemperatureK(chain), expected: numberIn(check.expected, 'T_sys_K'), tolerance: toleranceOf(check, 'K') });
    const got = gainOverTemperatureDbPerK(numberIn(check.inputs, 'G_dBi'), chain);
    expectWithin({ quantity: 'G/T', unit: 'dB/K', got, expected: numberIn(check.expected, 'G_over_T'), tolerance: toleranceOf(check, 'dB') });
  },
  'rcs-01': (check) => {
    const wavelengthM = SPEED_OF_LIGHT_M_PER_S / (numberIn(check.inputs, 'f_GHz') * 1e9);
    const got = powerRatioToDb(plateCrossSectionM2(numberIn(check.inputs, 'side_m') ** 2, wavelengthM));
    expectWithin({ quantity: 'cross-section', unit: 'dBsm', got, expected: numberIn(check.expected, 'rcs_dBsm'), tolerance: toleranceOf(check, 'dB') });
  },
  'link-21': compareRelay,
  'link-22': (check) => {
    const offset = eirpDensityOffsetDb(numberIn(check.inputs, 'power_W'), 0, numberIn(check.inputs, 'occupied_bandwidth_Hz'), numberIn(check.inputs, 'reference_bandwidth_Hz'));
    const got = numbersIn(check.inputs, 'gain_dBi').map((gain) => gain + offset);
    expectWithin({ quantity: 'EIRP density', unit: 'dBW', got, expected: numbersIn(check.expected, 'eirp_density_dBW_per_reference_bandwidth'), tolerance: toleranceOf(check, 'dB') });
  },
  'rf-01': (check) => {
    const limits = numbersIn(check.inputs, 'f_GHz').map((ghz) => exposureLimits(ghz * 1e9));
    const compare = (name: string, got: readonly number[], expected: readonly number[]): void =>
      got.forEach((value, i) => expectWithin({ quantity: name, unit: 'W/m2', got: value, expected: expected[i], tolerance: relative(check, expected[i]) }));
    compare('public, local', limits.map((each) => limitOf(each.icnirpPublicLocal).limitWPerM2), numbersIn(check.expected, 'public_local'));
    compare('occupational, local', limits.map((each) => limitOf(each.icnirpOccupationalLocal).limitWPerM2), numbersIn(check.expected, 'occupational_local'));
    compare('public, whole body', limits.map((each) => limitOf(each.icnirpPublic).limitWPerM2), limits.map(() => numberIn(check.expected, 'public_whole_body')));
    compare('occupational, whole body', limits.map((each) => limitOf(each.icnirpOccupational).limitWPerM2), limits.map(() => numberIn(check.expected, 'occupational_whole_body')));
  },
  'rf-02': (check) => {
    const limits = exposureLimits(numberIn(check.inputs, 'f_GHz') * 1e9);
    const [general, occupational] = [limitOf(limits.fccPublic), limitOf(limits.fccOccupational)];
    const got = [general.limitWPerM2 / 10, occupational.limitWPerM2 / 10, general.averagingMin, occupational.averagingMin];
    const expected = ['general_mW_cm2', 'occupational_mW_cm2', 'general_averaging_min', 'occupational_averaging_min'].map((name) => numberIn(check.expected, name));
    expectWithin({ quantity: 'limits in mW/cm2 and minutes', unit: '', got, expected, tolerance: toleranceOf(check) });
  },
  'rf-03': compareAperture,
  'rf-04': compareAperture,
  'feed-05': (check) => {
    const angles = numbersIn(check.inputs, 'F_over_D').map((ratio) => subtendedHalfAngleRad(ratio, 'paraboloid'));
    const exponents = angles.map((angle) => bestFeedExponent(angle, 'paraboloid'));
    expectWithin({ quantity: 'half angle', unit: 'deg', got: angles.map(degFromRad), expected: numbersIn(check.expected, 'theta_half_deg'), tolerance: 1e-4 });
    expectWithin({ quantity: 'best exponent', unit: '', got: exponents, expected: numbersIn(check.expected, 'q_opt'), tolerance: toleranceOf(check, 'q_abs') });
    const got = exponents.map((exponent, i) => feedEfficiency(exponent, angles[i], 'paraboloid'));
    expectWithin({ quantity: 'efficiency', unit: '', got, expected: numbersIn(check.expected, 'eta_max'), tolerance: toleranceOf(check, 'eta_abs') });
  },
  'feed-07': (check) => {
    const got = feedExponentOfHalfWidth(radFromDeg(numberIn(check.inputs, 'half_width_deg')), -10);
    expectWithin({ quantity: 'exponent', unit: '', got, expected: numberIn(check.expected, 'q'), tolerance: toleranceOf(check, 'abs') });
  },
};

/** Numbers from textbooks and recommendations that the list above does not hold. */
export const linkBookChecks: CheckTable = {
  'book-friis': (check) => {
    const { inputs } = check;
    const mismatches = numbersIn(inputs, 'reflection_coefficients').map((gamma) => -powerRatioToDb(1 - gamma * gamma));
    const frequencyHz = 10e9;
    const distanceM = (numberIn(inputs, 'distance_wavelengths') * SPEED_OF_LIGHT_M_PER_S) / frequencyHz;
    const got = receivedPowerDbm({ powerW: numberIn(inputs, 'P_W'), gainsDbi: numbersIn(inputs, 'directivities_dB'), lossesDb: [...mismatches, freeSpaceLossDb(frequencyHz, distanceM)] });
    expectWithin({ quantity: 'received power', unit: 'dBm', got, expected: powerRatioToDb(numberIn(check.expected, 'received_mW')), tolerance: toleranceOf(check, 'dB') });
  },
  'book-fspl': (check) => {
    expectWithin({ quantity: 'constant', unit: 'dB', got: freeSpaceLossDb(1e9, 1000), expected: numberIn(check.expected, 'constant_dB'), tolerance: toleranceOf(check, 'dB') });
  },
  'book-noise': (check) => {
    const got = noisePowerDbm(numberIn(check.inputs, 'T_K'), numberIn(check.inputs, 'B_Hz'));
    expectWithin({ quantity: 'noise', unit: 'dBm', got, expected: numberIn(check.expected, 'noise_dBm'), tolerance: toleranceOf(check, 'dB') });
  },
  'book-noise-figure': (check) => {
    const got = systemTemperatureK({ antennaTemperatureK: 0, lineLossDb: 0, lineTemperatureK: 290, noiseFigureDb: numberIn(check.inputs, 'NF_dB') });
    expectWithin({ quantity: 'temperature', unit: 'K', got, expected: numberIn(check.expected, 'T_K'), tolerance: toleranceOf(check, 'K') });
  },
  'book-plate': (check) => {
    const wavelengthM = SPEED_OF_LIGHT_M_PER_S / (numberIn(check.inputs, 'f_GHz') * 1e9);
    const got = powerRatioToDb(plateCrossSectionM2(numberIn(check.inputs, 'area_m2'), wavelengthM));
    expectWithin({ quantity: 'cross-section', unit: 'dBsm', got, expected: numberIn(check.expected, 'rcs_dBsm'), tolerance: toleranceOf(check, 'dB') });
  },
  'book-icnirp-local': (check) => {
    const limits = numbersIn(check.inputs, 'f_GHz').map((ghz) => exposureLimits(ghz * 1e9));
    const tolerance = toleranceOf(check, 'W_m2');
    expectWithin({ quantity: 'public', unit: 'W/m2', got: limits.map((each) => limitOf(each.icnirpPublicLocal).limitWPerM2), expected: numbersIn(check.expected, 'public_W_m2'), tolerance });
    expectWithin({ quantity: 'occupational', unit: 'W/m2', got: limits.map((each) => limitOf(each.icnirpOccupationalLocal).limitWPerM2), expected: numbersIn(check.expected, 'occupational_W_m2'), tolerance });
  },
  'book-aperture-28': compareAperture,
  'book-aperture-zero': compareAperture,
};

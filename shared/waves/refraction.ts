/** Tangential components of a wave vector in units of k0: index times direction cosine. */
export interface TangentialIndex {
  readonly u: number;
  readonly v: number;
}

/** What leaves a surface that adds a phase to what falls on it. */
export type OutgoingWave =
  | {
      readonly kind: 'propagating';
      /** Tangential components in units of k0. */
      readonly tangential: TangentialIndex;
      /** From the surface normal on the side it leaves to. */
      readonly thetaRad: number;
      readonly phiRad: number;
    }
  | {
      readonly kind: 'evanescent';
      readonly tangential: TangentialIndex;
      /** Tangential wavenumber over that of the medium: above 1, so no wave travels away. */
      readonly magnitude: number;
    };

export interface SurfacePhase {
  /** Incident wave: n1 times the tangential cosines of its direction of travel (not of the vector towards its source). */
  readonly incident: TangentialIndex;
  /** Gradient of the phase the surface adds, rad/m, exp(+j omega t). */
  readonly gradientXRadPerM: number;
  readonly gradientYRadPerM: number;
  readonly wavenumberRadPerM: number;
  /** Refractive index on the side the wave leaves to: n1 again for reflection, n2 for transmission. */
  readonly outgoingIndex: number;
}

/**
 * The generalised law of reflection and refraction, both tangential components:
 * n2 (u2, v2) = n1 (u1, v1) - grad(phase) / k0, the minus because time is exp(+j omega t).
 *
 * N. Yu et al., Science 334, 333-337, 2011; both components: F. Aieta et al., Nano Letters 12, 1702-1706, 2012 (from memory).
 * Exact for the direction of a uniform gradient; says nothing of how much power goes there.
 */
export function outgoingWave(surface: SurfacePhase): OutgoingWave {
  const u = surface.incident.u - surface.gradientXRadPerM / surface.wavenumberRadPerM;
  const v = surface.incident.v - surface.gradientYRadPerM / surface.wavenumberRadPerM;
  const magnitude = Math.hypot(u, v) / surface.outgoingIndex;
  const tangential = { u, v };
  if (magnitude > 1) return { kind: 'evanescent', tangential, magnitude };
  return { kind: 'propagating', tangential, thetaRad: Math.asin(magnitude), phiRad: magnitude === 0 ? 0 : Math.atan2(v, u) };
}

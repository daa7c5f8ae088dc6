const MINUS = '\u2212';

/** An angle for a sentence, written as on the screens: 12.5°, with a true minus and no negative zero. */
export function degreesText(angleDeg: number, digits = 1): string {
  const digitsText = Math.abs(angleDeg).toFixed(digits);
  return `${angleDeg < 0 && Number(digitsText) !== 0 ? MINUS : ''}${digitsText}°`;
}

/** A direction for a sentence. */
export function directionText(thetaDeg: number, phiDeg: number, digits = 1): string {
  return `θ ${degreesText(thetaDeg, digits)}, φ ${degreesText(phiDeg, digits)}`;
}

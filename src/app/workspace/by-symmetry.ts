/** Above this, in dB, a cross-polar field vanishes by symmetry and the number is that of rounding. */
export const BY_SYMMETRY_DB = 100;

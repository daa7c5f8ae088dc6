/** Speed of light in vacuum, m/s; exact by definition of the metre (SI Brochure, 9th ed., 2019). */
export const SPEED_OF_LIGHT_M_PER_S = 299_792_458;

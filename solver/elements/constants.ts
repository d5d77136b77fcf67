/** Constants and defaults of the device laws, each with unit and source. */

/** Boltzmann constant, J/K; exact (SI Brochure, 9th edition, 2019). */
export const BOLTZMANN = 1.380649e-23;

/** Elementary charge, C; exact (SI Brochure, 9th edition, 2019). */
export const ELEMENTARY_CHARGE = 1.602176634e-19;

/** Temperature at which parameters hold, K: 25 °C, the data-sheet convention. */
export const REFERENCE_TEMPERATURE = 298.15;

/** 0 °C, K (SI Brochure, 9th edition). */
export const ICE_POINT = 273.15;

/** Band gap of silicon, eV (common practice near room temperature). */
export const SILICON_BAND_GAP = 1.12;

/** The declared leak, S: across every junction and every channel, part of the equations and named in the record. */
export const DECLARED_LEAK = 5e-13;

/** No resistance goes below this, Ω: two perfect shorts in parallel have no answer. */
export const RESISTANCE_FLOOR = 1e-3;

/** A junction's exponential is continued by its tangent once its slope resistance has fallen to this, Ω. */
export const JUNCTION_GUARD_RESISTANCE = 10e-3;

/** Saturation current of a junction of a discrete part where nothing is stated, A. */
export const DISCRETE_SATURATION_CURRENT = 1e-12;

/** Saturation current of a junction on a chip where nothing is stated, A. */
export const INTEGRATED_SATURATION_CURRENT = 1e-15;

/** Thermal voltage kT/q, V, at a temperature in kelvin: 25.85 mV at 300 K. */
export const thermalVoltage = (temperature: number): number => (BOLTZMANN / ELEMENTARY_CHARGE) * temperature;

/** Boltzmann constant, J/K, exact (SI Brochure, 9th edition, 2.3.1). */
export const boltzmann = 1.380649e-23;

/** Elementary charge, C, exact (SI Brochure, 9th edition, 2.3.1). */
export const elementaryCharge = 1.602176634e-19;

/** 25 °C in kelvins: the temperature of every figure whose temperature is not said. */
export const roomTemperature = 298.15;

/** Thermal voltage kT/e in volts at an absolute temperature in kelvins; 25.69 mV at 25 °C. */
export function thermalVoltage(temperature: number): number {
  if (!(temperature > 0)) throw new RangeError(`thermalVoltage: temperature must be above 0 K, got ${temperature}`);
  return (boltzmann * temperature) / elementaryCharge;
}

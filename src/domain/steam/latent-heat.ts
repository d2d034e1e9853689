import { celsius, type Celsius } from '../units/quantity';
import { saturationPressureMPa, steamEnthalpy, waterEnthalpy } from './if97';

/** Beyond these no sterilizer works; a temperature outside of them counts as the nearer end. Ours, no source. */
const coolest = celsius(50);
const hottest = celsius(200);

/**
 * Latent heat of saturated steam in kJ/kg at a temperature in degrees C: what it takes to make steam of water, and what
 * the steam leaves where it turns to water again. Source: IAPWS-IF97, regions 1 and 2 on the line of saturation.
 */
export function latentHeat(temperatureC: Celsius): number {
  const temperatureK = Math.min(Math.max(temperatureC, coolest), hottest) + 273.15;
  const pressureMPa = saturationPressureMPa(temperatureK);
  return steamEnthalpy(temperatureK, pressureMPa) - waterEnthalpy(temperatureK, pressureMPa);
}

/**
 * Conductivity of sea water by the Practical Salinity Scale 1978 (Unesco technical papers in marine science 36 and 44),
 * with temperatures on the scale of 1968 as the scale's polynomials want them, at atmospheric pressure unless a
 * pressure is given.
 */

/** Conductivity in S/m of standard sea water: salinity 35, 15 °C, atmospheric pressure. */
export const STANDARD_CONDUCTIVITY = 4.2914;

const A = [0.008, -0.1692, 25.3851, 14.0941, -7.0261, 2.7081];
const B = [0.0005, -0.0056, -0.0066, -0.0375, 0.0636, -0.0144];
const C = [0.6766097, 2.00564e-2, 1.104259e-4, -6.9698e-7, 1.0031e-9];
const K = 0.0162;

function horner(coefficients: readonly number[], x: number): number {
  let sum = 0;
  for (let i = coefficients.length - 1; i >= 0; i--) sum = sum * x + coefficients[i];
  return sum;
}

/** Conductivity ratio of salinity 35 at t °C to the same at 15 °C. */
function temperatureRatio(t: number): number {
  return horner(C, t);
}

/** Salinity from Rt, the ratio to salinity 35 at the same temperature. */
function salinityOf(ratio: number, t: number): number {
  const root = Math.sqrt(ratio);
  return horner(A, root) + ((t - 15) / (1 + K * (t - 15))) * horner(B, root);
}

/** The pressure factor Rp of the scale; pressure above atmospheric in decibars. */
function pressureFactor(ratio: number, t: number, pressure: number): number {
  return (
    1 +
    (pressure * (2.07e-5 + pressure * (-6.37e-10 + pressure * 3.989e-15))) /
      (1 + t * (3.426e-2 + t * 4.464e-4) + (4.215e-1 - 3.107e-3 * t) * ratio)
  );
}

/**
 * Practical salinity from the conductivity ratio to standard sea water (salinity 35, 15 °C, no pressure).
 * Valid for salinities 2 to 42, −2 to 35 °C; pressure above atmospheric in decibars.
 */
export function practicalSalinity(ratio: number, temperatureC: number, pressureDbar = 0): number {
  const local = ratio / (temperatureRatio(temperatureC) * pressureFactor(ratio, temperatureC, pressureDbar));
  return salinityOf(local, temperatureC);
}

/** Conductivity in S/m at atmospheric pressure; salinity 2 to 42, −2 to 35 °C. Bisection: the scale rises with the ratio. */
export function seaWaterConductivity(salinity: number, temperatureC: number): number {
  let low = 0;
  let high = 2;
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (salinityOf(middle, temperatureC) < salinity) low = middle;
    else high = middle;
  }
  return STANDARD_CONDUCTIVITY * temperatureRatio(temperatureC) * ((low + high) / 2);
}

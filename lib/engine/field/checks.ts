/** Checks that come with every field solution: what must hold for any resistance, whatever the outline. */

import { ElementField } from "./bounds/element-field";
import type { FieldEnergies } from "./bounds/energies";
import type { ReachedBounds } from "./bounds/goal";
import { currentOf } from "./bounds/bracket";
import type { DiscreteField, SolvedPair } from "./solve/pair";

export interface FieldCheck {
  readonly name: "voltage-independence" | "current-continuity" | "second-route";
  readonly passed: boolean;
  readonly deviation: number;
  readonly tolerance: number;
}

const ROUNDING_TOLERANCE = 1e-9;

/**
 * `voltage-independence`: the power of the field at 1 V and at 2.5 V gives the same resistance. `current-continuity`: the
 * currents out of all terminals, taken from the stream function, add up to nothing. `second-route`: the power
 * ∫E·J, E from the potential and J from the stream function, is the current times the voltage, and the bracket is the
 * right way round.
 */
export function fieldChecks(pair: SolvedPair, energies: FieldEnergies, bounds: ReachedBounds): FieldCheck[] {
  const voltage = voltageDeviation(pair);
  const continuity = continuityDeviation(pair);
  const route = routeDeviation(pair, energies);
  const { lower, upper } = bounds.resistance;
  return [
    check("voltage-independence", voltage, voltage <= ROUNDING_TOLERANCE),
    check("current-continuity", continuity, continuity <= ROUNDING_TOLERANCE),
    check("second-route", route, route <= ROUNDING_TOLERANCE && lower <= upper),
  ];
}

function check(name: FieldCheck["name"], deviation: number, passed: boolean): FieldCheck {
  return { name, passed, deviation, tolerance: ROUNDING_TOLERANCE };
}

function voltageDeviation(pair: SolvedPair): number {
  const [field] = pair.potentials;
  const volts = 2.5;
  const raised: DiscreteField = {
    x: field.x.map((value) => volts * value),
    prescribed: field.prescribed.map((value) => volts * value),
  };
  const one = power(pair, field);
  return Math.abs(power(pair, raised) / (volts * volts) - one) / one;
}

/** ∫σ̄|∇V|² with the mean conductivity where it varies: enough to compare two voltages. */
function power(pair: SolvedPair, field: DiscreteField): number {
  const element = new ElementField();
  const { set, potentialSystem } = pair;
  let total = 0;
  for (let t = 0; t < set.triangleCount; t++) {
    element.load(potentialSystem, field, t);
    element.recover(potentialSystem, t);
    element.gradient(potentialSystem, t);
    for (let k = 0; k < set.layouts[t].modes; k++) {
      total += potentialSystem.weight[t] * (element.p[k] ** 2 + element.q[k] ** 2);
    }
  }
  return total;
}

function routeDeviation({ currents, streams, streamSystem }: SolvedPair, { work }: FieldEnergies): number {
  let worst = 0;
  streams.forEach((field, a) => {
    const { value } = currentOf(streamSystem, field, currents[a]);
    worst = Math.max(worst, Math.abs(work[a] - value) / value);
  });
  return worst;
}

function continuityDeviation(pair: SolvedPair): number {
  const { currents, streams, streamSystem } = pair;
  let worst = 0;
  for (const field of streams) {
    let sum = 0;
    let size = 0;
    for (const form of currents) {
      const { value } = currentOf(streamSystem, field, form);
      sum += value;
      size += Math.abs(value) / 2;
    }
    worst = Math.max(worst, Math.abs(sum) / size);
  }
  return worst;
}

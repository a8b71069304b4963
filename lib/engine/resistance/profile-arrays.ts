/** Plot arrays: 101 samples along the flow from the high terminal, and across it where the medium varies there. */
import { CompensatedSum } from "../numeric/compensated-sum";
import type { AlongFlow, Coordinate, Shape } from "../shape/define-shape";
import { AlongConductor, uniformLaw } from "./along-conductor";
import type { ProfileResult } from "./result-schema";
import type { Solution } from "./solution";

const SAMPLES = 101;

/** The arrays, or null where the shape has no law along its flow. */
export function sampleProfile(
  solution: Solution,
  shape: Shape,
  voltage: number,
  per: ProfileResult["per"],
): ProfileResult | null {
  const { view } = solution;
  switch (view.kind) {
    case "along": {
      const conductor = view.conductor();
      return { ...alongArrays(conductor, solution.value, voltage, unitOf(shape, conductor.flow)), per };
    }
    case "across": {
      const { along } = view.tubes;
      const unit = new AlongConductor(along, uniformLaw(1, along.extent));
      // Seen along the flow, the graded section acts like one of this mean resistivity.
      const mean = solution.value / unit.total().value;
      const conductor = new AlongConductor(along, uniformLaw(mean, along.extent));
      const { flow } = view.conductor;
      const position: number[] = [];
      const conductivity: number[] = [];
      const currentDensity: number[] = [];
      for (let i = 0; i < SAMPLES; i++) {
        const x = placeOf(i, flow.extent);
        position.push(flow.start + x);
        conductivity.push(view.conductor.conductivityAt(x));
        currentDensity.push(conductivity[i] * flow.fieldPerVolt(x) * voltage);
      }
      return {
        ...alongArrays(conductor, solution.value, voltage, unitOf(shape, along)),
        per,
        across: {
          coordinate: flow.coordinate,
          unit: view.medium.coordinate.unit,
          position,
          conductivity,
          currentDensity,
        },
      };
    }
    case "media":
    case "factor":
      return null;
  }
}

function alongArrays(
  conductor: AlongConductor,
  resistance: number,
  voltage: number,
  unit: Coordinate["unit"],
): Omit<ProfileResult, "per"> {
  const { flow } = conductor;
  const current = voltage / resistance;
  const drops: number[] = [0];
  const sum = new CompensatedSum();
  for (let i = 1; i < SAMPLES; i++) {
    sum.add(
      conductor.between(placeOf(i - 1, flow.extent), placeOf(i, flow.extent), { relative: 1e-11 }).value,
    );
    drops.push(sum.value);
  }
  const whole = drops[SAMPLES - 1];
  const position: number[] = [];
  const potential: number[] = [];
  const field: number[] = [];
  const currentDensity: number[] = [];
  const conductivity: number[] = [];
  for (let i = 0; i < SAMPLES; i++) {
    const x = placeOf(i, flow.extent);
    const resistivity = conductor.resistivityAt(x);
    const density = current / (flow.section(x) * (flow.scale?.(x) ?? 1));
    position.push(flow.start + x);
    // From the nearer terminal, so that the last samples end at exactly 0.
    potential.push(voltage * ((whole - drops[i]) / whole));
    field.push(density * resistivity);
    currentDensity.push(density);
    conductivity.push(1 / resistivity);
  }
  return { coordinate: flow.coordinate, unit, position, potential, field, currentDensity, conductivity };
}

function placeOf(i: number, extent: number): number {
  return i === SAMPLES - 1 ? extent : (extent * i) / (SAMPLES - 1);
}

function unitOf(shape: Shape, flow: AlongFlow): Coordinate["unit"] {
  return shape.coordinates.find(({ name }) => name === flow.coordinate)?.unit ?? "m";
}

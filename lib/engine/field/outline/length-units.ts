/** Units of an outline's coordinates and their length in metres; the inch is 25.4 mm exactly (1959 agreement). */
export const LENGTH_UNITS_M = {
  km: 1e3,
  m: 1,
  dm: 1e-1,
  cm: 1e-2,
  mm: 1e-3,
  um: 1e-6,
  µm: 1e-6,
  μm: 1e-6,
  nm: 1e-9,
  in: 0.0254,
  mil: 25.4e-6,
  ft: 0.3048,
} as const;

export type LengthUnit = keyof typeof LENGTH_UNITS_M;

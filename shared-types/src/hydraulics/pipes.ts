/** Nominal sizes of schedule 40 DWV pipe, inches. */
export const nominalSizesIn = [1.25, 1.5, 2, 3, 4, 6] as const;
export type NominalSizeIn = (typeof nominalSizesIn)[number];

/** Nominal sizes of water lines in houses, inches: common practice, no published source. */
export const waterSizesIn = [0.375, 0.5, 0.75, 1, 1.25, 1.5, 2] as const;
export type WaterSizeIn = (typeof waterSizesIn)[number];

export const pipeKinds = ['pvc-sch40', 'abs-sch40'] as const;
export type PipeKind = (typeof pipeKinds)[number];

/** Outside diameter and minimum wall, inches, of schedule 40 (ASTM D1785, D2665, D2661): one table, PVC and ABS share it. */
const schedule40: Readonly<Record<NominalSizeIn, { outsideIn: number; wallIn: number }>> = {
  1.25: { outsideIn: 1.66, wallIn: 0.14 },
  1.5: { outsideIn: 1.9, wallIn: 0.145 },
  2: { outsideIn: 2.375, wallIn: 0.154 },
  3: { outsideIn: 3.5, wallIn: 0.216 },
  4: { outsideIn: 4.5, wallIn: 0.237 },
  6: { outsideIn: 6.625, wallIn: 0.28 },
};

/** A US gallon is exactly 231 cubic inches. */
const cubicInchesPerGallon = 231;

export const isNominalSize = (nominalIn: number): nominalIn is NominalSizeIn => nominalIn in schedule40;

/** Inside diameter in inches, by the convention ID = OD − 2 × minimum wall. */
export function insideDiameterIn(nominalIn: NominalSizeIn): number {
  const { outsideIn, wallIn } = schedule40[nominalIn];
  return outsideIn - 2 * wallIn;
}

/** Area of the bore in square inches. */
export const boreAreaSqIn = (nominalIn: NominalSizeIn): number => (Math.PI / 4) * insideDiameterIn(nominalIn) ** 2;

/** What one foot of the pipe holds, US gallons. */
export const gallonsPerFoot = (nominalIn: NominalSizeIn): number =>
  (boreAreaSqIn(nominalIn) * 12) / cubicInchesPerGallon;

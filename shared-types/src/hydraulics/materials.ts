/** What pipe and fittings are made of. */
export const materials = ['pvc', 'abs', 'cpvc', 'pex', 'copper', 'cast-iron', 'steel'] as const;
export type Material = (typeof materials)[number];

const plastics: ReadonlySet<Material> = new Set(['pvc', 'abs', 'cpvc', 'pex']);

/** Plastic pipe goes on stretching under pressure and may shatter under air. */
export const isPlastic = (material: Material): boolean => plastics.has(material);

/**
 * May this material be put under compressed air? For DWV and PEX only where both the rule and every maker allow it
 * (IPC 312.3, CPC 712.1; IRC 2018 M2101.10 for PEX).
 */
export function mayHoldAir(material: Material, allowed: { airOnPlastic: boolean; makersAllowAir: boolean }): boolean {
  return !isPlastic(material) || (allowed.airOnPlastic && allowed.makersAllowAir);
}

/** As `mayHoldAir` for water lines: never in PVC, ABS or CPVC, whoever allows it (a pipe maker's technical guide). */
export function mayHoldAirInWaterLine(
  material: Material,
  allowed: { airOnPlastic: boolean; makersAllowAir: boolean },
): boolean {
  return material === 'pex' ? mayHoldAir(material, allowed) : !isPlastic(material);
}

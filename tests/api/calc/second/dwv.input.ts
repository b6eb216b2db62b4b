export type DwvMethod =
  'stack-to-roof' | 'attic-cut' | 'laundry-box' | 'laundry-riser' | 'standpipe' | 'sectional' | 'air';
export const dwvMethods: DwvMethod[] = [
  'stack-to-roof',
  'attic-cut',
  'laundry-box',
  'laundry-riser',
  'standpipe',
  'sectional',
  'air',
];
export const materials = ['pvc', 'abs', 'cpvc', 'pex', 'copper', 'cast-iron', 'steel'] as const;
export type Material = (typeof materials)[number];

export interface Floor {
  name: string;
  elevationFt: number;
}

export interface Plug {
  name: string;
  elevationFt: number;
  ratedPsi: number;
  nominalIn?: number | null;
}

export interface DwvRequest {
  floors?: Floor[];
  lowestFittingFt: number;
  highestFittingFt: number;
  ventTerminalFt: number;
  cappedVents?: number;
  atticCutFt?: number | null;
  standpipeFt?: number | null;
  laundry?: { floor: string; boxOutletFt: number; branchFt: number } | null;
  method: DwvMethod;
  riserIn?: number;
  airPsi?: number | null;
  airVolumeGal?: number | null;
  maxSectionFt?: number | null;
  pipeMaterial: Material;
  rule: {
    acceptedMethods: DwvMethod[];
    headRule: { kind: 'above-highest-fitting'; feet: number } | { kind: 'fill-level' };
    airOnPlastic?: boolean;
  };
  makersAllowAir?: boolean;
  plugs?: Plug[];
  pipes?: { nominalIn: number; material: string; bottomFt: number; topFt: number; lengthFt: number }[];
  fillRateGpm?: number | null;
  waterTempF?: number;
  elevationFt?: number;
}

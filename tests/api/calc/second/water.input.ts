import type { Floor, Material } from './dwv.input.js';

export const media = ['water', 'water-topped-with-air', 'air'] as const;
export type Medium = (typeof media)[number];
export type IncrementRow = { upToPsi: number; incrementPsi: number } | { percent: number };

export interface WaterRequest {
  gaugeFt: number;
  highestOutletFt: number;
  lowestFittingFt: number;
  floors?: Floor[];
  medium: Medium;
  pipeMaterials: Material[];
  makersAllowAir?: boolean;
  airVolumeGal?: number | null;
  rule: {
    minimumPsi: number;
    preferredPsi?: number | null;
    measuredAt?: 'gauge' | 'highest-outlet';
    media: Medium[];
    airOnPlastic?: boolean;
    gaugeIncrements?: IncrementRow[] | null;
  };
  lowestRatedPsi: number;
  lowestRatedAirPsi?: number | null;
  supplyPsi?: number | null;
  gauge: { rangePsi: number; incrementPsi: number };
  waterTempF?: number;
  elevationFt?: number;
}

/** Weight of water, lb/ft³, as NDS Supplement 3.1.3 rounds it. */
const WATER = 62.4;
/** Cubic inches in a cubic foot. */
const CUBIC_FOOT = 1728;
/** Moisture content, %, that own weight is taken at. */
export const MOISTURE = { dry: 15, wet: 30 } as const;

/** Density, lb/ft³, of wood of specific gravity `G` at a moisture content in % (NDS Supplement 3.1.3). */
export function density(G: number, moisture: number): number {
  return WATER * (G / (1 + 0.009 * G * moisture)) * (1 + moisture / 100);
}

/** Own weight, lb/in, of a section of `area`, in². */
export function ownWeight(area: number, G: number, service: 'dry' | 'wet'): number {
  return (area * density(G, MOISTURE[service])) / CUBIC_FOOT;
}

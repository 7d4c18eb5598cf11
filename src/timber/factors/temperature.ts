import type { Units } from '../../quantity/index.ts';
import type { Member } from '../member.ts';
import type { Property } from './wet-service.ts';

type Temperature = Member['temperature'];

/** Ct by temperature: strength dry, strength wet, modulus of elasticity (NDS Table 2.3.3). */
const SUSTAINED: Readonly<
  Record<Temperature, { readonly dry: number; readonly wet: number; readonly E: number }>
> = {
  normal: { dry: 1, wet: 1, E: 1 },
  '100-125 F': { dry: 0.8, wet: 0.7, E: 0.9 },
  '125-150 F': { dry: 0.7, wet: 0.5, E: 0.9 },
};

/** Ct of a property (NDS 2.3.3). */
export function temperatureFactor(temperature: Temperature, wet: boolean, property: Property): number {
  const row = SUSTAINED[temperature];
  return property === 'E' ? row.E : wet ? row.wet : row.dry;
}

/** Why Ct has its value. */
export function temperatureReason(temperature: Temperature, wet: boolean, units: Units): string {
  const range = temperatureIn(temperature, units);
  return temperature === 'normal'
    ? `${range}, NDS 2.3.3`
    : `sustained ${range.replace('-', ' to ')}, ${wet ? 'wet' : 'dry'}, NDS Table 2.3.3`;
}

/** The ranges of NDS Table 2.3.3, and the same in whole degrees Celsius. */
const RANGE: Readonly<Record<Temperature, Readonly<Record<Units, string>>>> = {
  normal: { us: 'at most 100 F', si: 'at most 38 C' },
  '100-125 F': { us: '100-125 F', si: '38-52 C' },
  '125-150 F': { us: '125-150 F', si: '52-66 C' },
};

/** "at most 100 F", "38-52 C". */
export function temperatureIn(temperature: Temperature, units: Units): string {
  return RANGE[temperature][units];
}

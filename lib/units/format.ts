import type { Dimension, UnitSystem } from './dimension';

export const unitOf = (dimension: Dimension, _system: UnitSystem): { symbol: string; name: string } =>
  dimension === 'speed' ? { symbol: 'km/h', name: 'kilometres per hour' } : { symbol: dimension === 'length' ? 'm' : '', name: '' };

export const formatValue = (si: number, dimension: Dimension, _system: UnitSystem, { decimals = 3 }: { decimals?: number } = {}): string =>
  (dimension === 'speed' ? si * 3.6 : si).toFixed(decimals);

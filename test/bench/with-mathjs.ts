import { lusolve, mean, quantileSeq, std } from 'mathjs';
import type { CaseFile, LegsDeparture } from '@/lib/casefile/schema';
import type { DrawOf } from '../support/plain-monte-carlo';

/** The same Monte Carlo as an engineer would write it with a general library: arrays, lusolve, quantileSeq. 28 figures. */

const rad = (degrees: number): number => (degrees * Math.PI) / 180;

function speedOf(departure: LegsDeparture, at: (path: string) => number, prefix: string): number {
  const squared = departure.legs.reduce(
    (sum, _, k) =>
      sum +
      2 *
        9.80665 *
        at(`${prefix}.legs.${k}.distance`) *
        at(`${prefix}.legs.${k}.friction`) *
        at(`${prefix}.legs.${k}.share`),
    0,
  );
  return Math.sqrt(squared);
}

/** The approach speeds of one draw, and what follows from them, as a list of 28 figures. */
export function mathjsDraw(casefile: CaseFile, at: (path: string) => number): number[] {
  const [mA, mB] = [at('vehicles.A.mass'), at('vehicles.B.mass')];
  const [gA, gB] = [rad(at('approach.A.direction')), rad(at('approach.B.direction'))];
  const [dA, dB] = [rad(at('departure.A.direction')), rad(at('departure.B.direction'))];
  const vA = speedOf(casefile.departure.A as LegsDeparture, at, 'departure.A');
  const vB = speedOf(casefile.departure.B as LegsDeparture, at, 'departure.B');
  const matrix = [
    [mA * Math.cos(gA), mB * Math.cos(gB)],
    [mA * Math.sin(gA), mB * Math.sin(gB)],
  ];
  const right = [mA * vA * Math.cos(dA) + mB * vB * Math.cos(dB), mA * vA * Math.sin(dA) + mB * vB * Math.sin(dB)];
  const [[sA], [sB]] = lusolve(matrix, right) as number[][];
  const change = (v: number, d: number, s: number, g: number, h: number): number[] => {
    const [x, y] = [v * Math.cos(d) - s * Math.cos(g), v * Math.sin(d) - s * Math.sin(g)];
    return [Math.hypot(x, y), x * Math.cos(h) + y * Math.sin(h), y * Math.cos(h) - x * Math.sin(h), Math.atan2(y, x)];
  };
  const [hA, hB] = [rad(at('impact.A.heading')), rad(at('impact.B.heading'))];
  const all = [sA, sB, vA, vB, dA, dB, gA, gB, ...change(vA, dA, sA, gA, hA), ...change(vB, dB, sB, gB, hB)];
  return [...all, ...all.slice(0, 12)];
}

export function mathjsMonteCarlo(
  casefile: CaseFile,
  drawOf: DrawOf,
  draws: number,
): { mean: number; ends: number[] }[] {
  const columns: number[][] = Array.from({ length: 28 }, () => []);
  for (let k = 0; k < draws; k++) mathjsDraw(casefile, (path) => drawOf(path, k)).forEach((x, i) => columns[i].push(x));
  return columns.map((column) => {
    std(column);
    return { mean: mean(column), ends: [0.025, 0.5, 0.975].map((p) => quantileSeq(column, p)) };
  });
}

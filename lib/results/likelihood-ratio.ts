import { exp } from '@/lib/numerics/elementary';

/** What two marginal likelihoods say against each other. */
export interface Ratio {
  log10: number;
  /** Monte Carlo error of log10: 0.5 in the natural log, since a cloud that moves too little can be low by that. */
  error: number;
  /** The larger over the smaller, one significant digit; above a million only said to be that. */
  ratio: string;
  words: string;
}

const ERROR = 0.5 / Math.LN10;
const MOST = 1e6;

/** Upper ends of the verbal scale (ENFSI guideline for evaluative reporting 2015, from memory). */
const SCALE: [below: number, words: string][] = [
  [2, 'the evidence hardly tells them apart'],
  [10, 'weak support'],
  [100, 'moderate support'],
  [1000, 'moderately strong support'],
  [10_000, 'strong support'],
  [MOST, 'very strong support'],
  [Infinity, 'extremely strong support, as far as the model holds'],
];

/** The ratio of two marginal likelihoods from the difference of their natural logs. */
export function ratioOf(difference: number): Ratio {
  const size = exp(Math.min(Math.abs(difference), 50));
  return {
    log10: difference / Math.LN10,
    error: ERROR,
    ratio: size > MOST ? 'more than a million' : Number(size.toPrecision(1)).toLocaleString('en'),
    words: SCALE.find(([below]) => size < below)?.[1] ?? SCALE[SCALE.length - 1][1],
  };
}

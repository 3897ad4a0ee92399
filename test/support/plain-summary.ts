/** The plain twin of summarise: sorts with a comparator and reads the definitions of JCGM 101:2008, 7.6 and 7.7.2, as they stand. */
export function plainSummary(values: readonly number[], coverage: number) {
  const y = [...values].sort((a, b) => a - b);
  const M = y.length;
  const at = (rank: number): number => y[rank - 1];
  const mean = y.reduce((sum, v) => sum + v, 0) / M;
  const sd = M === 1 ? 0 : Math.sqrt(y.reduce((sum, v) => sum + (v - mean) ** 2, 0) / (M - 1));
  const median = M % 2 === 1 ? at((M + 1) / 2) : (at(M / 2) + at(M / 2 + 1)) / 2;
  const pM = coverage * M;
  const q = Math.min(M - 1, Number.isInteger(pM) ? pM : Math.trunc(pM + 0.5));
  if (q === M - 1) return { mean, sd, median, low: at(1), high: at(M), shortest: [at(1), at(M)] };
  const half = (M - q) / 2;
  const r = Number.isInteger(half) ? half : Math.trunc((M - q + 1) / 2);
  let best = 1;
  for (let s = 2; s <= M - q; s++) if (at(s + q) - at(s) < at(best + q) - at(best)) best = s;
  return { mean, sd, median, low: at(r), high: at(r + q), shortest: [at(best), at(best + q)] };
}

import type { CheckRule } from './check';

/** The two runs of a fit may differ by this, in standard uncertainties of a mean, and in the log of the evidence. */
const APART = 0.3;
const LOG_EVIDENCE = 1;

/** A fit whose two runs disagree has not converged, and carries no headline. */
export const converged: CheckRule = {
  id: 'converged',
  source: 'screening value: means of two independent runs within 0.3 standard uncertainties, log evidence within 1',
  find({ solution: { fit } }) {
    if (!fit) return null;
    const { disagreement, logEvidence } = fit.secondRun;
    const evidence = Math.abs(fit.logEvidence - logEvidence);
    const bad = disagreement > APART || evidence > LOG_EVIDENCE;
    return {
      level: bad ? 'fail' : 'pass',
      value: disagreement,
      limit: APART,
      says: `Two independent runs differ by ${disagreement.toFixed(2)} standard uncertainties in the speeds, and by ${evidence.toFixed(2)} in the log of the evidence.`,
      advice: bad
        ? 'Not converged: ask for more draws, or state more of what is known; until then this is no answer.'
        : undefined,
      paths: ['analysis.draws'],
    };
  },
};

/**
 * Why an impact, or the travel after it, is impossible, in the order in which a draw with several of them is counted:
 * the bodies do not close at the contact point, do not part after it, one came backwards against its stated direction, the
 * impulse pulls, the restitution is out of its range, energy is gained, a leg has no real speed at its start, the vehicle does
 * not come to rest, never parts, or a figure is not finite.
 */
export const REASONS = [
  'notClosing',
  'notParting',
  'backwards',
  'pulling',
  'restitution',
  'energyGain',
  'leg',
  'noRest',
  'neverParts',
  'notFinite',
] as const;

export type Reason = (typeof REASONS)[number];

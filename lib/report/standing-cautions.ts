/** The cautions that stand before every number: on the page of cases and in every report. */
export const STANDING_CAUTIONS = [
  'This is a decision aid for a qualified person. It does not replace a licensed engineer or a qualified reconstructionist, and it gives no legal advice. Practice and licensing laws differ from place to place; ‘engineer’ is a protected term in some.',
  'The results depend on the evidence and the models listed. If a fact changes, they have to be worked again.',
  'The model is that of two rigid bodies in one plane. It is not for rollover, steep changes of crossfall, articulated units at impact, motorcycles, pedestrians, trips over poles or kerbs, three vehicles in contact at once, or major deformation or over-ride.',
  'Its range is a closing speed along the normal of about 0.5 to 10 m/s (2 to 36 km/h). Outside it the ranges of restitution, contact time and friction are unsupported (screening value).',
  'Delta-V is a measure of vehicle motion. No conclusion about injury, its presence, absence, cause or severity may be drawn from it here. Research and courts are divided on it.',
] as const;

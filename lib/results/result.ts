import * as z from 'zod';

/** The result file, version 1: what command, HTTP route and browser worker all answer. Units as in names.ts. */

const number = z.number();

export const bandSchema = z
  .strictObject({
    mean: number,
    sd: number,
    median: number,
    /** Ends of the probabilistically symmetric interval at the stated coverage. */
    low: number,
    high: number,
    /** Ends of the shortest interval at the stated coverage. */
    shortest: z.tuple([number, number]),
  })
  .meta({ id: 'Band' });

export const LEVELS = ['pass', 'note', 'caution', 'fail'] as const;

export const checkSchema = z
  .strictObject({
    id: z.string(),
    level: z.enum(LEVELS),
    /** The number that was held against the limit; left out where there is none. */
    value: number.optional(),
    limit: number.optional(),
    /** What was found, with the case's own numbers, and what to do about it. */
    says: z.string(),
    advice: z.string().optional(),
    /** Where the limit comes from. */
    source: z.string(),
    /** The values of the case that it is about, as dotted paths. */
    paths: z.array(z.string()),
  })
  .meta({ id: 'Check' });

/** A separation velocity, m/s and deg, and yaw rate, deg/s. */
const separationSchema = z.strictObject({ speed: number, direction: number, yawRate: number, otherTurn: z.boolean() });

const named = z.record(z.string(), number);
const bands = z.record(z.string(), bandSchema);
const seatResult = z.strictObject({ name: z.string(), central: named, bands });

/** What the method fit says of itself. */
const fitSchema = z
  .strictObject({
    /** log of the marginal likelihood: SI units, radians, normalised densities. */
    logEvidence: number,
    /** Particles that differ from one another. */
    effectiveSize: number,
    /** Share of the proposed moves that were taken, and the number of temperatures. */
    acceptance: number,
    temperatures: number,
    /** Observed less predicted at the central state, in standard uncertainties, by path; chi-square is the sum of their squares. */
    residuals: named,
    chiSquare: number,
    degreesOfFreedom: number,
    /** 1 less the share of its prior variance that is left of each unknown, by path. */
    contraction: named,
    /** A second, independent run: its marginal likelihood, and the largest difference of a mean over the standard uncertainty. */
    secondRun: z.strictObject({ logEvidence: number, disagreement: number }),
  })
  .meta({ id: 'Fit' });

/** A rival account: the case with its changes, fitted. Without figures where no state explains it, and then why. */
const hypothesisSchema = z
  .strictObject({
    name: z.string(),
    central: named,
    bands,
    logEvidence: number.optional(),
    says: z.string().optional(),
  })
  .meta({ id: 'Hypothesis' });

export const resultSchema = z
  .strictObject({
    format: z.literal('retrodict-result'),
    version: z.literal(1),
    case: z.string(),
    engine: z.string(),
    method: z.enum(['directions', 'restitution', 'fit']),
    seed: number,
    draws: number,
    coverage: number,
    central: named,
    bands,
    impossible: z.record(z.string(), number),
    checks: z.array(checkSchema),
    sensitivity: z.record(z.string(), z.record(z.string(), z.strictObject({ first: number, total: number }))),
    fit: fitSchema.nullable(),
    hypotheses: z.array(hypothesisSchema),
    seats: z.strictObject({ A: z.array(seatResult), B: z.array(seatResult) }),
    more: z.strictObject({
      /** 2-norm condition number of [mA hA, mB hB] (directions). */
      condition: number.optional(),
      /** Sine of the angle between the approach directions (directions). */
      sinBetween: number.optional(),
      /** 1/e (restitution). */
      amplification: number.optional(),
      /** The most energy that the contact could take, J, and the share of it that was lost. */
      closingEnergy: number.optional(),
      shareLost: number.optional(),
      /** Peak of a haversine pulse, m/s^2: twice the mean acceleration. */
      'A.peakAcceleration': number.optional(),
      'B.peakAcceleration': number.optional(),
      /** Yaw inertia used, kg m^2. */
      'A.yawInertia': number.optional(),
      'B.yawInertia': number.optional(),
      /** Yaw rate after contact that the impulse predicts from that before, deg/s. */
      'A.predictedYawRate': number.optional(),
      'B.predictedYawRate': number.optional(),
      /** Every separation found that leads to the measured rest pose, that answered first; `otherTurn`: with a full turn more or less. */
      'A.separations': z.array(separationSchema).optional(),
      'B.separations': z.array(separationSchema).optional(),
      /** Momentum (kg m/s) and angular momentum about the contact point (kg m^2/s), before and after. */
      momentumBefore: z.tuple([number, number]).optional(),
      momentumAfter: z.tuple([number, number]).optional(),
      angularMomentumBefore: number.optional(),
      angularMomentumAfter: number.optional(),
      /** Tyre impulse over contact impulse, an upper bound. */
      tyreShare: number.optional(),
      /** A contact that lasts: its duration, s; the greatest depth of the contact point beyond the line and the way it slid along it, m. */
      contactDuration: number.optional(),
      penetration: number.optional(),
      slide: number.optional(),
      /** What the tyres gave meanwhile, N s, and over the contact impulse. */
      'A.tyreImpulse': number.optional(),
      'B.tyreImpulse': number.optional(),
      'A.tyreShare': number.optional(),
      'B.tyreShare': number.optional(),
      /** What the road gave meanwhile, grade included: impulse in the world, N s, and change of the yaw rate, deg/s. */
      'A.roadImpulse': z.tuple([number, number]).optional(),
      'B.roadImpulse': z.tuple([number, number]).optional(),
      'A.roadYawRate': number.optional(),
      'B.roadYawRate': number.optional(),
    }),
  })
  .meta({ id: 'RetrodictResult', title: 'Retrodict result file, version 1' });

export type Result = z.infer<typeof resultSchema>;
export type Band = z.infer<typeof bandSchema>;
export type Check = z.infer<typeof checkSchema>;
export type FitResult = z.infer<typeof fitSchema>;
export type HypothesisResult = z.infer<typeof hypothesisSchema>;
export type Level = (typeof LEVELS)[number];
export type SeatResult = z.infer<typeof seatResult>;

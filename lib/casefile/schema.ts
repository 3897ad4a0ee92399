import * as z from 'zod';

/**
 * The case file, version 1. Numbers are SI, angles degrees, yaw rates degrees per second; the world frame is a
 * right-handed plan view, x right, y up, angles counter-clockwise from +x. Strict: an unknown key is an error.
 * A key whose value would be null may be left out. What spans several keys (limits around a value, a wheelbase shorter
 * than its vehicle) is in relations.ts; what a method needs is in needs.ts.
 */

export const VEHICLE_IDS = ['A', 'B'] as const;
export type VehicleId = (typeof VEHICLE_IDS)[number];

const number = z.number();
const positive = number.gt(0);
const text = z.string();

/** How well a quantity is known (JCGM 101:2008, 6.4). Limits lie around the value; a triangular mode is the value. */
export const spreadSchema = z
  .discriminatedUnion('shape', [
    z.strictObject({ shape: z.literal('fixed') }),
    z.strictObject({ shape: z.literal('normal'), sd: positive }),
    z.strictObject({ shape: z.literal('rectangular'), low: number, high: number }),
    z.strictObject({ shape: z.literal('triangular'), low: number, high: number }),
  ])
  .meta({ id: 'Spread' });

const quantityOf = (value: z.ZodNumber, id: string) =>
  z.strictObject({ value, spread: spreadSchema.optional(), source: text.optional() }).meta({ id });

export const anyQuantity = quantityOf(number, 'Quantity');
const positiveQuantity = quantityOf(positive, 'PositiveQuantity');
const nonNegativeQuantity = quantityOf(number.min(0), 'NonNegativeQuantity');
const shareQuantity = quantityOf(number.min(0).max(1), 'ShareQuantity');

const seatSchema = z.strictObject({ name: text, x: number, y: number }).meta({ id: 'Seat' });

const vehicleSchema = z
  .strictObject({
    name: text,
    length: positive,
    width: positive,
    wheelbase: positive,
    track: positive,
    frontOverhang: positive,
    frontAxleToMassCentre: positiveQuantity,
    mass: positiveQuantity,
    yawInertia: positiveQuantity.nullish(),
    seats: z.array(seatSchema).optional(),
  })
  .meta({ id: 'Vehicle' });

const poseSchema = z.strictObject({ x: anyQuantity, y: anyQuantity, heading: anyQuantity }).meta({ id: 'Pose' });

const impactSchema = z.strictObject({
  A: poseSchema,
  B: poseSchema,
  point: z.strictObject({ x: anyQuantity, y: anyQuantity }),
  plane: anyQuantity,
  restitution: shareQuantity.nullish(),
  impulseRatio: anyQuantity.nullish(),
  friction: nonNegativeQuantity.nullish(),
  slide: nonNegativeQuantity.nullish(),
  lineOn: z.enum(VEHICLE_IDS).nullish(),
});

const approachSchema = z
  .strictObject({
    direction: anyQuantity.nullish(),
    speed: nonNegativeQuantity.nullish(),
    yawRate: anyQuantity,
    slip: anyQuantity.nullish(),
  })
  .meta({ id: 'Approach' });

const legSchema = z
  .strictObject({
    distance: nonNegativeQuantity,
    friction: positiveQuantity,
    share: shareQuantity,
    grade: anyQuantity,
  })
  .meta({ id: 'Leg' });

const wheelSchema = z.strictObject({ braking: shareQuantity, steer: anyQuantity }).meta({ id: 'Wheel' });

const fourWheelsSchema = z.strictObject({
  frontLeft: wheelSchema,
  frontRight: wheelSchema,
  rearLeft: wheelSchema,
  rearRight: wheelSchema,
});
const wheelsSchema = z.union([z.strictObject({ all: z.strictObject({ braking: shareQuantity }) }), fourWheelsSchema]);

const legsDeparture = z.strictObject({
  kind: z.literal('legs'),
  direction: anyQuantity,
  yawRate: anyQuantity.nullish(),
  endSpeed: nonNegativeQuantity,
  legs: z.array(legSchema).min(1),
});

const restSchema = z.strictObject({
  x: anyQuantity.nullish(),
  y: anyQuantity.nullish(),
  heading: anyQuantity.nullish(),
});

const spinDeparture = z.strictObject({
  kind: z.literal('spin'),
  rest: restSchema,
  friction: positiveQuantity,
  slope: z.strictObject({ grade: anyQuantity, uphill: anyQuantity }).nullish(),
  onset: nonNegativeQuantity.nullish(),
  wheels: wheelsSchema,
});

export const departureSchema = z.discriminatedUnion('kind', [legsDeparture, spinDeparture]).meta({ id: 'Departure' });

const damageSchema = z
  .strictObject({
    depths: z.array(nonNegativeQuantity).min(2).max(12),
    stations: z.array(number).nullish(),
    width: positiveQuantity,
    forceAngle: anyQuantity,
    a: positiveQuantity,
    b: positiveQuantity,
  })
  .meta({ id: 'Damage' });

const recordedSchema = z
  .strictObject({ forward: anyQuantity.nullish(), left: anyQuantity.nullish() })
  .meta({ id: 'Recorded' });

const pointSchema = z.tuple([number, number]);

const surfaceSchema = z.strictObject({ name: text, outline: z.array(pointSchema).min(3), friction: positiveQuantity });

const sceneSchema = z.strictObject({
  background: z
    .strictObject({
      image: z.string().regex(/^[0-9a-f]{64}$/),
      metresPerPixel: positive,
      x: number,
      y: number,
      rotation: number,
      opacity: number.min(0).max(1),
    })
    .nullish(),
  surfaces: z.array(surfaceSchema).optional(),
  marks: z.array(z.strictObject({ kind: text, label: text, points: z.array(pointSchema).min(1) })).optional(),
  north: number.optional(),
});

const hypothesisSchema = z.strictObject({
  name: text,
  set: z.record(z.string(), z.union([departureSchema, anyQuantity, z.null()])),
});

export const METHODS = ['directions', 'restitution', 'fit'] as const;
export const CONTACTS = ['instant', 'lasting'] as const;

const analysisSchema = z.strictObject({
  method: z.enum(METHODS),
  contact: z.enum(CONTACTS).nullish(),
  draws: z.union([z.int().min(1).max(10_000_000), z.literal('auto')]).nullish(),
  seed: z.int().min(0).max(Number.MAX_SAFE_INTEGER).nullish(),
  coverage: number.gt(0).lt(1).nullish(),
});

const both = <T extends z.ZodType>(each: T) => z.strictObject({ A: each, B: each });
const bothMaybe = <T extends z.ZodType>(each: T) => z.strictObject({ A: each.nullish(), B: each.nullish() });

export const caseSchema = z
  .strictObject({
    format: z.literal('retrodict-case'),
    version: z.literal(1),
    title: text,
    reference: text.nullish(),
    notes: text.nullish(),
    display: z.strictObject({ units: z.enum(['metric', 'us']), paper: z.enum(['A4', 'Letter']) }).nullish(),
    vehicles: both(vehicleSchema),
    impact: impactSchema,
    approach: both(approachSchema),
    departure: bothMaybe(departureSchema),
    damage: bothMaybe(damageSchema).nullish(),
    recorded: bothMaybe(recordedSchema).nullish(),
    pulse: positiveQuantity.nullish(),
    restOffset: restSchema.nullish(),
    scene: sceneSchema.nullish(),
    hypotheses: z.array(hypothesisSchema).nullish(),
    analysis: analysisSchema,
  })
  .meta({ id: 'RetrodictCase', title: 'Retrodict case file, version 1' });

export type CaseFile = z.infer<typeof caseSchema>;
export type Quantity = z.infer<typeof anyQuantity>;
export type Spread = z.infer<typeof spreadSchema>;
export type Vehicle = z.infer<typeof vehicleSchema>;
export type Departure = z.infer<typeof departureSchema>;
export type LegsDeparture = z.infer<typeof legsDeparture>;
export type SpinDeparture = z.infer<typeof spinDeparture>;
export type FourWheels = z.infer<typeof fourWheelsSchema>;
export type Leg = z.infer<typeof legSchema>;
export type Surface = z.infer<typeof surfaceSchema>;
export type Damage = z.infer<typeof damageSchema>;
export type Method = (typeof METHODS)[number];

import { cos, sin } from '@/lib/numerics/elementary';
import { type Grip, gripOf, tyreForce } from './wheel';

/** A wheel in vehicle axes from the mass centre, m, its static load on level ground, N, and what the driver or damage does to it. */
export interface Wheel {
  x: number;
  y: number;
  load: number;
  /** Share of friction times load, [0, 1], from the onset on; before it the wheel rolls freely. */
  braking: number;
  /** rad, counter-clockwise. */
  steer: number;
}

/** One wheel on its load, rolling freely or braked. */
export class Tyre {
  readonly x: number;
  readonly y: number;
  readonly braking: number;
  private readonly cosSteer: number;
  private readonly sinSteer: number;
  private rolling: Grip;
  private braked: Grip;

  constructor(
    wheel: Wheel,
    /** On the grade, N. */
    readonly load: number,
    friction: number,
  ) {
    this.x = wheel.x;
    this.y = wheel.y;
    this.braking = wheel.braking;
    this.cosSteer = cos(wheel.steer);
    this.sinSteer = sin(wheel.steer);
    this.rolling = gripOf(load, friction, 0);
    this.braked = gripOf(load, friction, wheel.braking);
  }

  /** On another friction. */
  regrip(friction: number): void {
    if (friction === this.braked.friction) return;
    this.rolling = gripOf(this.load, friction, 0);
    this.braked = gripOf(this.load, friction, this.braking);
  }

  /** Where it stands in the world for the motion y at offset `at` and the cosine and sine of its heading. */
  under(y: Float64Array, at: number, c: number, s: number): [number, number] {
    return [y[at] + c * this.x - s * this.y, y[at + 1] + s * this.x + c * this.y];
  }

  /** Force on the hub in vehicle axes, N, for the velocity of the hub in them, m/s. */
  force(forward: number, left: number, braked: boolean, out: { along: number; across: number }): void {
    const { cosSteer, sinSteer } = this;
    const grip = braked ? this.braked : this.rolling;
    if (sinSteer === 0) return tyreForce(forward, left, grip, out);
    tyreForce(forward * cosSteer + left * sinSteer, left * cosSteer - forward * sinSteer, grip, out);
    const { along, across } = out;
    out.along = along * cosSteer - across * sinSteer;
    out.across = along * sinSteer + across * cosSteer;
  }
}

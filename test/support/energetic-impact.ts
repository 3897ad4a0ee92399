import { type ContactFrame } from '@/lib/mechanics/contact-frame';

/**
 * The impulse of an instant contact with Coulomb friction that ends where the normal work given back is e^2 of that of
 * compression (Stronge 1990, Proc. R. Soc. Lond. A 431): followed over the normal impulse, piece by piece. Oracle for the
 * contact that lasts, whose limit it is.
 */
export function energeticImpulse(
  { Knn, Ktt, Knt }: ContactFrame,
  closing: { un: number; ut: number },
  e: number,
  f: number,
): { Jn: number; Jt: number; keepsSense: boolean } {
  let { un, ut } = closing;
  let [Jn, Jt, given, owed] = [0, 0, 0, Infinity];
  let way = ut === 0 ? slipFromRest() : Math.sign(ut);
  const first = way;
  for (let piece = 0; piece < 10; piece++) {
    const ratio = way === 0 ? -Knt / Ktt : way * f;
    const fall = Knn + ratio * Knt;
    const drift = Knt + ratio * Ktt;
    const stops = way === 0 || ut / drift <= 0 ? Infinity : ut / drift;
    const turns = un > 0 ? un / fall : Infinity;
    const ends = un <= 0 ? (un + Math.sqrt(un * un + 2 * fall * (owed - given))) / fall : Infinity;
    const step = Math.min(stops, turns, ends);
    const work = un * step - (fall * step * step) / 2;
    if (un > 0) given += work;
    else given -= work;
    Jn += step;
    Jt += ratio * step;
    un -= fall * step;
    ut -= drift * step;
    if (step === ends) break;
    if (step === turns) [un, owed, given] = [0, e * e * given, 0];
    if (step === stops) [ut, way] = [0, slipFromRest()];
  }
  return { Jn, Jt, keepsSense: way === first && way !== 0 };

  /** Which way the slip goes on from none: 0 where friction holds it. */
  function slipFromRest(): number {
    return Math.abs(Knt) <= f * Ktt ? 0 : -Math.sign(Knt);
  }
}

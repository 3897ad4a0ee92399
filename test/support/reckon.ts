/**
 * Reckons a printed line of the worked calculation as a person with a calculator would: only from the figures on the
 * paper. Understands the notation of lib/report/maths.ts: numbers, pairs, + - * ^, frac, root, sin, cos, atan2, degrees.
 */
export type Reckoned = number | [number, number];

const TOKEN = /\d+(?:\.\d+)?|frac|root|sin|cos|atan2|arctan|[-+*^(){}[\],°π×]/g;

export function reckon(line: string): Reckoned {
  const tokens = line.replaceAll('"', '').match(TOKEN) ?? [];
  let at = 0;
  const take = (wanted: string): void => {
    if (tokens[at] !== wanted) throw new Error(`expected ${wanted} at ${tokens.slice(at).join(' ')} in ${line}`);
    at++;
  };
  const sum = (): Reckoned => {
    let total = tokens[at] === '-' ? (at++, times(-1, product())) : product();
    while (tokens[at] === '+' || tokens[at] === '-') {
      const sign = tokens[at++] === '+' ? 1 : -1;
      total = plus(total, times(sign, product()));
    }
    return total;
  };
  const product = (): Reckoned => {
    let value = power();
    for (;;) {
      if (tokens[at] === '*' || tokens[at] === '×') at++;
      else if (!STARTS.test(tokens[at] ?? '')) return value;
      value = times(value, power());
    }
  };
  const power = (): Reckoned => {
    const base = atom();
    if (tokens[at] !== '^') return base;
    at++;
    return number(base) ** number(tokens[at] === '{' ? group() : atom());
  };
  const group = (): Reckoned => {
    take('{');
    const value = sum();
    take('}');
    return value;
  };
  const atom = (): Reckoned => {
    const token = tokens[at++];
    if (/^\d/.test(token)) return tokens[at] === '°' ? (at++, (Number(token) * Math.PI) / 180) : Number(token);
    if (token === 'π') return Math.PI;
    if (token === 'frac') return times(group(), 1 / number(group()));
    if (token === 'root') return Math.sqrt(number(group()));
    if (token === 'sin') return Math.sin(number(signed()));
    if (token === 'cos') return Math.cos(number(signed()));
    if (token === 'arctan') return (Math.atan(number(signed())) * 180) / Math.PI;
    if (token === 'atan2') {
      const [y, x] = atom() as [number, number];
      return (Math.atan2(y, x) * 180) / Math.PI;
    }
    if (token === '(' || token === '[') return bracket(token === '(' ? ')' : ']');
    throw new Error(`cannot read ${token} in ${line}`);
  };
  const signed = (): Reckoned => (tokens[at] === '-' ? (at++, times(-1, atom())) : atom());
  const bracket = (close: string): Reckoned => {
    const first = sum();
    if (tokens[at] !== ',') return (take(close), first);
    at++;
    const second = sum();
    take(close);
    return [number(first), number(second)];
  };
  const value = sum();
  if (at < tokens.length) throw new Error(`left over: ${tokens.slice(at).join(' ')} in ${line}`);
  return value;
}

/** What an implied product may go on with. */
const STARTS = /^(\d|frac|root|sin|cos|\(|\[)/;

function number(value: Reckoned): number {
  if (typeof value !== 'number') throw new Error('a pair where a number was expected');
  return value;
}

function plus(a: Reckoned, b: Reckoned): Reckoned {
  if (typeof a === 'number' && typeof b === 'number') return a + b;
  if (typeof a === 'number' || typeof b === 'number') throw new Error('a pair and a number cannot be added');
  return [a[0] + b[0], a[1] + b[1]];
}

function times(a: Reckoned, b: Reckoned): Reckoned {
  if (typeof a === 'number' && typeof b === 'number') return a * b;
  if (typeof a === 'number') return [a * (b as [number, number])[0], a * (b as [number, number])[1]];
  if (typeof b === 'number') return [a[0] * b, a[1] * b];
  throw new Error('two pairs cannot be multiplied');
}

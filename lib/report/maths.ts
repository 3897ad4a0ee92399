/**
 * A small notation for the formulas of the report, parsed into plain data that any renderer can set in type:
 *   v_{A}′^2   sub- and superscripts      frac{a}{b}  a fraction      root{a}  a square root
 *   !v         a vector (bold)            "kg m"      upright words   *        a raised dot,  -  a minus sign
 * A single letter is a symbol (italic), a longer run is a name (upright: sin, cos). Subscripts are upright, save k.
 */
export type MathsNode =
  | { kind: 'text' | 'symbol' | 'vector'; text: string }
  | { kind: 'sub' | 'sup' | 'root'; of: MathsNode[] }
  | { kind: 'fraction'; over: MathsNode[]; under: MathsNode[] };

const TOKEN = /frac(?=\{)|root(?=\{)|"[^"]*"|![A-Za-z]|[_^]|[{}]|[ΔΣ]|\p{L}+|[^\p{L}"!_^{}]/gu;
/** Capitals that stand for an operation, upright: the difference and the sum. */
const UPRIGHT = new Set(['Δ', 'Σ']);

/** Throws for a malformed formula: our mistake, never a user's. */
export function parseMaths(source: string): MathsNode[] {
  const tokens = source.match(TOKEN) ?? [];
  let at = 0;
  const group = (): MathsNode[] => {
    if (tokens[at] !== '{') return [leaf(tokens[at++])];
    at++;
    const nodes = run();
    if (tokens[at++] !== '}') throw new Error(`maths: a brace is not closed in ${source}`);
    return nodes;
  };
  const node = (): MathsNode => {
    const token = tokens[at++];
    if (token === '_') return { kind: 'sub', of: group().map(asSubscript) };
    if (token === '^') return { kind: 'sup', of: group() };
    if (token === 'root') return { kind: 'root', of: group() };
    if (token === 'frac') return { kind: 'fraction', over: group(), under: group() };
    return leaf(token);
  };
  const run = (): MathsNode[] => {
    const nodes: MathsNode[] = [];
    while (at < tokens.length && tokens[at] !== '}') nodes.push(node());
    return joined(nodes);
  };
  const nodes = run();
  if (at < tokens.length) throw new Error(`maths: a brace too many in ${source}`);
  return nodes;
}

function leaf(token: string): MathsNode {
  if (token.startsWith('"')) return { kind: 'text', text: token.slice(1, -1) };
  if (token.startsWith('!')) return { kind: 'vector', text: token.slice(1) };
  if (UPRIGHT.has(token)) return { kind: 'text', text: token };
  if (/^\p{L}$/u.test(token)) return { kind: 'symbol', text: token };
  return { kind: 'text', text: token === '-' ? '−' : token === '*' ? '·' : token };
}

const asSubscript = (node: MathsNode): MathsNode =>
  node.kind === 'symbol' && node.text !== 'k' ? { kind: 'text', text: node.text } : node;

/** Neighbouring upright pieces become one. */
function joined(nodes: MathsNode[]): MathsNode[] {
  const out: MathsNode[] = [];
  for (const node of nodes) {
    const last = out.at(-1);
    if (node.kind === 'text' && last?.kind === 'text')
      out[out.length - 1] = { kind: 'text', text: last.text + node.text };
    else out.push(node);
  }
  return out;
}

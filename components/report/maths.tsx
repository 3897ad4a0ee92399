import { type MathsNode, parseMaths } from '@/lib/report/maths';
import styles from './maths.module.css';

/** A formula in the notation of lib/report/maths.ts, set in type. */
export function Maths({ of }: { of: string }) {
  return (
    <span className={styles.maths}>
      <Nodes of={parseMaths(of)} />
    </span>
  );
}

function Nodes({ of }: { of: MathsNode[] }) {
  return of.map((node, k) => <Node key={k} node={node} />);
}

function Node({ node }: { node: MathsNode }) {
  switch (node.kind) {
    case 'text':
      return node.text;
    case 'symbol':
      return <i>{node.text}</i>;
    case 'vector':
      return <b className={styles.vector}>{node.text}</b>;
    case 'sub':
      return (
        <sub>
          <Nodes of={node.of} />
        </sub>
      );
    case 'sup':
      return (
        <sup>
          <Nodes of={node.of} />
        </sup>
      );
    case 'root':
      return (
        <span className={styles.root}>
          √
          <span className={styles.radicand}>
            <Nodes of={node.of} />
          </span>
        </span>
      );
    case 'fraction':
      return (
        <span className={styles.fraction}>
          <span className={styles.over}>
            <Nodes of={node.over} />
          </span>
          <span className="visually-hidden"> / </span>
          <span className={styles.under}>
            <Nodes of={node.under} />
          </span>
        </span>
      );
  }
}

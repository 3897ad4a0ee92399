import type { Block, HeadlineFigure, PrintedCheck } from '@/lib/report/report';
import type { Level } from '@/lib/results/result';
import { Maths } from './maths';
import { PlanView } from './plan-view';
import { SpeedChart } from './speed-chart';
import { TableView } from './table-view';
import { WorkedSteps } from './worked-steps';
import styles from './report.module.css';

/** One block of a section. */
export function BlockView({ block }: { block: Block }) {
  switch (block.kind) {
    case 'paragraph':
      return <p className={styles.paragraph}>{block.text}</p>;
    case 'withheld':
      return <Withheld reasons={block.reasons} />;
    case 'headline':
      return <Headline figures={block.figures} />;
    case 'definitions':
      return <Definitions rows={block.rows} />;
    case 'list':
      return <List ordered={block.ordered} items={block.items} />;
    case 'table':
      return <TableView table={block} />;
    case 'symbols':
      return <Symbols rows={block.rows} />;
    case 'steps':
      return <WorkedSteps chapters={block.chapters} />;
    case 'plan':
      return <PlanView drawing={block.drawing} />;
    case 'speeds':
      return <SpeedChart figure={block.figure} />;
    case 'checks':
      return <Checks items={block.items} />;
    case 'signature':
      return <Signature lines={block.lines} />;
  }
}

function Headline({ figures }: { figures: HeadlineFigure[] }) {
  return (
    <dl className={styles.headline} data-headline>
      {figures.map(({ label, value, unit, interval }) => (
        <div key={label} className={styles.figure}>
          <dt>{label}</dt>
          <dd>
            <span className={styles.value}>
              {value} {unit}
            </span>
            <span className={styles.interval}>{interval}</span>
          </dd>
        </div>
      ))}
    </dl>
  );
}

function Withheld({ reasons }: { reasons: string[] }) {
  return (
    <div className={styles.withheld} data-withheld>
      <p className={styles.withheldTitle}>The result is withheld: a check failed.</p>
      <ul>
        {reasons.map((reason) => (
          <li key={reason}>{reason}</li>
        ))}
      </ul>
    </div>
  );
}

function Definitions({ rows }: { rows: [string, string][] }) {
  return (
    <dl className={styles.definitions}>
      {rows.map(([term, text]) => (
        <div key={term}>
          <dt>{term}</dt>
          <dd>{text}</dd>
        </div>
      ))}
    </dl>
  );
}

function List({ ordered, items }: { ordered: boolean; items: string[] }) {
  const Kind = ordered ? 'ol' : 'ul';
  return (
    <Kind className={styles.list}>
      {items.map((item) => (
        <li key={item}>{item}</li>
      ))}
    </Kind>
  );
}

function Symbols({ rows }: { rows: [string, string][] }) {
  return (
    <dl className={styles.symbols}>
      {rows.map(([symbol, meaning]) => (
        <div key={symbol}>
          <dt>
            <Maths of={symbol} />
          </dt>
          <dd>{meaning}</dd>
        </div>
      ))}
    </dl>
  );
}

const LEVEL_WORDS: Record<Level, string> = { fail: 'failed', caution: 'caution', note: 'note', pass: 'passed' };

function Checks({ items }: { items: PrintedCheck[] }) {
  return (
    <ul className={styles.checks}>
      {items.map(({ level, title, says, advice, source }) => (
        <li key={title} data-level={level}>
          <p className={styles.level}>{LEVEL_WORDS[level]}</p>
          <div>
            <p className={styles.checkTitle}>{title}</p>
            <p>{[says, advice].filter(Boolean).join(' ')}</p>
            <p className={styles.source}>Limit: {source}.</p>
          </div>
        </li>
      ))}
    </ul>
  );
}

function Signature({ lines }: { lines: string[] }) {
  return (
    <div className={styles.signature}>
      <dl>
        {lines.map((line) => (
          <div key={line}>
            <dt>{line}</dt>
            <dd />
          </div>
        ))}
      </dl>
      <p className={styles.seal}>Space for a seal</p>
    </div>
  );
}

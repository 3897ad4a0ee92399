import type { Drawing, Item, Point, Role } from '@/lib/report/plan-sheet';
import styles from './plan-view.module.css';

/** The plan at true scale: the drawing's millimetres are the paper's. */
export function PlanView({ drawing }: { drawing: Drawing }) {
  const { width, height, grid, items, scale, caption } = drawing;
  return (
    <figure className={styles.figure}>
      <svg
        className={styles.plan}
        width={`${width}mm`}
        height={`${height}mm`}
        viewBox={`0 0 ${width} ${height}`}
        role="img"
        aria-label={caption}
        data-scale={scale.ratio}
      >
        <defs>
          <Hatch id="plan-hatch" />
          <clipPath id="plan-frame">
            <rect width={width} height={height} />
          </clipPath>
        </defs>
        <g clipPath="url(#plan-frame)">
          {grid.map((line) => (
            <GridLine key={line.axis + line.metres} line={line} width={width} height={height} />
          ))}
          {items.map((item, k) => (
            <ItemView key={k} item={item} />
          ))}
        </g>
        <North angle={drawing.north} x={width - 10} y={11} />
        <rect width={width} height={height} className={styles.frame} />
      </svg>
      <div className={styles.foot}>
        <ScaleBar drawing={drawing} />
        <Legend drawing={drawing} />
      </div>
      <figcaption>{caption}</figcaption>
    </figure>
  );
}

function Hatch({ id }: { id: string }) {
  return (
    <pattern id={id} width="1.6" height="1.6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <rect width="1.6" height="1.6" className={styles.paper} />
      <line x1="0" y1="0" x2="0" y2="1.6" className={styles.hatch} />
    </pattern>
  );
}

function GridLine({
  line: { axis, at, metres },
  width,
  height,
}: {
  line: Drawing['grid'][number];
  width: number;
  height: number;
}) {
  return axis === 'x' ? (
    <g>
      <line x1={at} x2={at} y1={0} y2={height} className={styles.grid} />
      <text x={at + 0.6} y={height - 1} className={styles.coordinate}>
        {signed(metres)}
      </text>
    </g>
  ) : (
    <g>
      <line x1={0} x2={width} y1={at} y2={at} className={styles.grid} />
      <text x={0.8} y={at - 0.6} className={styles.coordinate}>
        {signed(metres)}
      </text>
    </g>
  );
}

const signed = (metres: number): string => String(Number(metres.toFixed(2))).replace('-', '−');

const path = (points: Point[]): string => points.map(([x, y]) => `${x.toFixed(2)},${y.toFixed(2)}`).join(' ');

function ItemView({ item }: { item: Item }) {
  switch (item.kind) {
    case 'polygon':
      return <polygon points={path(item.points)} className={styles.polygon} data-role={item.role} />;
    case 'line':
      return (
        <g data-role={item.role} className={styles.line}>
          <polyline points={path(item.points)} />
          {item.arrow && <ArrowHead points={item.points} />}
        </g>
      );
    case 'dot':
      return <Dot role={item.role} at={item.at} />;
    case 'label':
      return (
        <text x={item.at[0]} y={item.at[1]} className={item.strong ? styles.strong : styles.label}>
          {item.text}
        </text>
      );
  }
}

const HEAD = 2.6;

function ArrowHead({ points }: { points: Point[] }) {
  const [[x0, y0], [x, y]] = points.slice(-2);
  const turn = (Math.atan2(y - y0, x - x0) * 180) / Math.PI;
  return (
    <polygon
      points={`0,0 ${-HEAD},${-HEAD / 3.2} ${-HEAD},${HEAD / 3.2}`}
      transform={`translate(${x} ${y}) rotate(${turn})`}
      className={styles.head}
    />
  );
}

function Dot({ role, at: [x, y] }: { role: Role; at: Point }) {
  if (role === 'centre')
    return (
      <g className={styles.centre}>
        <circle cx={x} cy={y} r={0.9} />
        <path d={`M${x} ${y}m-1.6 0h3.2M${x} ${y}m0 -1.6v3.2`} />
      </g>
    );
  return (
    <g className={styles.point}>
      <circle cx={x} cy={y} r={1.3} />
    </g>
  );
}

function North({ angle, x, y }: { angle: number; x: number; y: number }) {
  const turn = 90 - angle;
  const letter = { x: x + 9 * Math.sin((turn * Math.PI) / 180), y: y - 9 * Math.cos((turn * Math.PI) / 180) };
  return (
    <g className={styles.north}>
      <circle cx={x} cy={y} r={7.4} className={styles.paper} />
      <g transform={`translate(${x} ${y}) rotate(${turn})`}>
        <path d="M0 6V-6" />
        <path d="M0 -6.5l-1.9 5h3.8z" className={styles.head} />
      </g>
      <text x={letter.x} y={letter.y + 1.1} className={styles.northLetter}>
        N
      </text>
    </g>
  );
}

function ScaleBar({ drawing: { scale } }: { drawing: Drawing }) {
  const long = (scale.bar * 1000) / scale.ratio;
  const parts = 4;
  return (
    <svg
      className={styles.bar}
      width={`${long + 16}mm`}
      height="11mm"
      viewBox={`-4 0 ${long + 16} 11`}
      role="img"
      aria-label={`Scale 1 to ${scale.ratio}`}
    >
      <text x={-4} y={3.4} className={styles.ratio}>
        Scale 1 : {scale.ratio}
      </text>
      {Array.from({ length: parts }, (_, k) => (
        <rect
          key={k}
          x={(k * long) / parts}
          y={5}
          width={long / parts}
          height={1.6}
          className={k % 2 === 0 ? styles.dark : styles.light}
        />
      ))}
      {[0, scale.bar / 2, scale.bar].map((metres) => (
        <text key={metres} x={(metres / scale.bar) * long} y={10} className={styles.barFigure}>
          {metres}
          {metres === scale.bar ? ' m' : ''}
        </text>
      ))}
    </svg>
  );
}

/** What the signs of the plan stand for, drawn as they are drawn there. */
function Legend({ drawing: { legend } }: { drawing: Drawing }) {
  return (
    <ul className={styles.legend}>
      {legend.map(({ role, text }) => (
        <li key={role}>
          <svg width="9mm" height="4.4mm" viewBox="0 0 9 4.4" aria-hidden="true">
            <Sample role={role} />
          </svg>
          {text}
        </li>
      ))}
    </ul>
  );
}

const DOTS: readonly Role[] = ['point', 'centre'];

function Sample({ role }: { role: Role }) {
  if (DOTS.includes(role)) return <Dot role={role} at={[4.5, 2.2]} />;
  if (role.startsWith('vehicle'))
    return <polygon points="0.5,0.5 8.5,0.5 8.5,3.9 0.5,3.9" className={styles.polygon} data-role={role} />;
  const arrow = /^(approach|travel|normal)/.test(role);
  return (
    <ItemView
      item={{
        kind: 'line',
        role,
        points: [
          [0.3, 2.2],
          [8.7, 2.2],
        ],
        arrow,
      }}
    />
  );
}

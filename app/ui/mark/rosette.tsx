const STEP = (2 * Math.PI) / 64;

/** Heights of the two bars that one hex digit draws, 1 to 4: its upper two bits left, its lower two right. */
export function cellHeights(digit: string): [left: number, right: number] {
  const value = Number.parseInt(digit, 16);
  return [1 + (value >> 2), 1 + (value & 3)];
}

function bar(inner: number, height: number, angle: number): string {
  const half = 0.3 * STEP;
  const at = (r: number, a: number) =>
    `${(50 + r * Math.cos(a)).toFixed(2)} ${(50 + r * Math.sin(a)).toFixed(2)}`;
  return `M${at(inner, angle - half)}L${at(inner + height, angle - half)}L${at(inner + height, angle + half)}L${at(inner, angle + half)}Z`;
}

function ring(digits: string, inner: number, unit: number): string {
  return [...digits]
    .map((digit, i) => {
      const [left, right] = cellHeights(digit);
      const angle = (2 * i + 0.5) * STEP - Math.PI / 2;
      return bar(inner, unit * left, angle) + bar(inner, unit * right, angle + STEP);
    })
    .join('');
}

const circles: [r: number, width: number][] = [
  [49, 0.5],
  [47.6, 1.1],
  [46.2, 0.5],
  [34.8, 0.5],
  [33.6, 1],
  [22.8, 0.5],
  [21.6, 1.1],
  [20.2, 0.5],
];

interface Props {
  /** The seal value of a warranty: 64 hex digits. Nothing else is drawn as a rosette. */
  sealValue: string;
  /** In px, 96 or more. */
  size?: number;
}

/** Two rings of 32 cells drawn from a seal value. It helps the eye compare; it is never the check itself. */
export function Rosette({ sealValue, size = 112 }: Props) {
  return (
    <svg
      className="rosette"
      viewBox="0 0 100 100"
      width={size}
      height={size}
      role="img"
      aria-label="Rosette drawn from the seal value"
    >
      <g fill="none" stroke="currentColor">
        {circles.map(([r, width]) => (
          <circle key={r} cx="50" cy="50" r={r} strokeWidth={width} />
        ))}
      </g>
      <path
        fill="currentColor"
        d={ring(sealValue.slice(0, 32), 36.2, 2.15) + ring(sealValue.slice(32, 64), 24.2, 2)}
      />
    </svg>
  );
}

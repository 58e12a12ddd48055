import type { RestRuleView } from '../types.ts';

/** Hours at which the rule is marked: each hour to 48, each six hours beyond; every sixth mark is long. */
export function graduations(hours: number): { hour: number; long: boolean }[] {
  const step = hours > 48 ? 6 : 1;
  const count = Math.floor(hours / step + 1e-9);
  return Array.from({ length: count + 1 }, (_, i) => ({ hour: i * step, long: i % 6 === 0 }));
}

interface Props {
  rule: RestRuleView;
  /** In px. */
  height?: number;
  over?: boolean;
}

/** The rule of a rest clock. Its words stand around it; this says only how much has gone by. */
export function RestRule({ rule, height = 26, over }: Props) {
  const marks = graduations(rule.hours)
    .map(({ hour, long }) => `M${hour} 0V${long ? 17 : 9}`)
    .join('');
  const fixed = { vectorEffect: 'non-scaling-stroke' as const };
  return (
    <svg
      className={`rule ${over ? 'rule-over' : ''}`}
      viewBox={`0 0 ${rule.hours} ${height}`}
      preserveAspectRatio="none"
      height={height}
      role="img"
      aria-label={rule.label}
    >
      <rect className="rule-ground" width={rule.hours} height={height} />
      <rect className="rule-elapsed" width={Number(rule.elapsed.toFixed(3))} height={height} />
      <path className="rule-marks" d={marks} {...fixed} />
      {rule.stops.length > 0 && (
        <path
          className="rule-stops"
          d={rule.stops.map((hour) => `M${hour} 0V${height}`).join('')}
          {...fixed}
        />
      )}
      <rect className="rule-edge" width={rule.hours} height={height} {...fixed} />
    </svg>
  );
}

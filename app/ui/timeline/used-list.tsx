import { Icon, type IconName } from '../icon.tsx';
import type { UsedView } from '../types.ts';

const kinds: Record<UsedView['kind'], { label: string; icon: IconName }> = {
  used: { label: 'Used', icon: 'pot' },
  bench: { label: 'Bench', icon: 'rule' },
  'into-tray': { label: 'Into the tray', icon: 'tray' },
  'out-of-tray': { label: 'Out of the tray', icon: 'tray' },
  rested: { label: 'Rested', icon: 'rest' },
  'kept-at': { label: 'Kept at', icon: 'rest' },
  hours: { label: 'Worked', icon: 'clock' },
};

/** What was used, put into the tray, how warm and damp it was. */
export function UsedList({ used }: { used: UsedView[] }) {
  if (used.length === 0) return null;
  return (
    <dl className="used">
      {used.map((line) => (
        <div key={line.kind + line.text} className="contents">
          <dt>
            <Icon name={kinds[line.kind].icon} size={18} />
            {kinds[line.kind].label}
          </dt>
          <dd>{line.text}</dd>
        </div>
      ))}
    </dl>
  );
}

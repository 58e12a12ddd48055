import { Icon } from '../icon.tsx';
import './add.css';

interface Props {
  /** "Rest, hours" */
  label: string;
  /** "24 h" */
  value: string;
  /** "clamps off Thu 16 April, 09:40" */
  under: string;
  less: string;
  more: string;
  onLess: () => void;
  onMore: () => void;
}

/** One figure with a key on either side, for fingers with glue on them. */
export function Stepper({ label, value, under, less, more, onLess, onMore }: Props) {
  return (
    <div className="stepper" role="group" aria-label={label}>
      <button type="button" className="btn" aria-label={less} onClick={onLess}>
        <Icon name="minus" size={24} />
      </button>
      <output>
        <b>{value}</b>
        {under}
      </output>
      <button type="button" className="btn" aria-label={more} onClick={onMore}>
        <Icon name="plus" size={24} />
      </button>
    </div>
  );
}

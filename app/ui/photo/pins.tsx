import type { PinView } from '../types.ts';

interface Props {
  pins: PinView[];
  chosen?: number;
  onChoose?: (n: number | undefined) => void;
}

const toggled = (n: number, chosen?: number) => (n === chosen ? undefined : n);
const kinds = { damage: 'Damage', remark: 'Remark' };

/** Numbered discs over a photo that is shown whole; each is a button that points at its line. */
export function Pins({ pins, chosen, onChoose }: Props) {
  return pins.map((pin) => (
    <button
      key={pin.n}
      type="button"
      className={`pin ${pin.kind === 'damage' ? 'pin-damage' : ''} ${pin.n === chosen ? 'pin-chosen' : ''}`}
      style={{ left: `${pin.x}%`, top: `${pin.y}%` }}
      aria-pressed={pin.n === chosen}
      aria-label={`Pin ${pin.n}, ${kinds[pin.kind].toLowerCase()}: ${pin.title}`}
      onClick={() => onChoose?.(toggled(pin.n, chosen))}
    >
      {pin.n}
    </button>
  ));
}

/** The lines that the pins point at, and the other way round. */
export function PinList({ pins, chosen, onChoose }: Props) {
  return (
    <ol className="pin-list">
      {pins.map((pin) => (
        <li key={pin.n}>
          <button
            type="button"
            aria-pressed={pin.n === chosen}
            onClick={() => onChoose?.(toggled(pin.n, chosen))}
          >
            <span className={`pin-n ${pin.kind === 'damage' ? 'pin-n-damage' : ''}`}>
              {pin.n}
              <span className="sr-only"> {kinds[pin.kind]}:</span>
            </span>
            <span>
              <b>{pin.title}</b> {pin.text}
            </span>
          </button>
        </li>
      ))}
    </ol>
  );
}

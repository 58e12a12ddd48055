import { Icon, type IconName } from '../icon.tsx';
import './add.css';

export interface TileView {
  key: string;
  label: string;
  icon: IconName;
  on: boolean;
}

/** What else belongs to the entry; a tile that is on shows its fields below. */
export function Tiles({ tiles, onToggle }: { tiles: TileView[]; onToggle: (key: string) => void }) {
  return (
    <div className="tiles" role="group" aria-label="What else belongs to it">
      {tiles.map((tile) => (
        <button
          key={tile.key}
          type="button"
          className="tile"
          aria-pressed={tile.on}
          onClick={() => onToggle(tile.key)}
        >
          <Icon name={tile.icon} size={26} />
          {tile.label}
        </button>
      ))}
    </div>
  );
}

import { Tick } from '../mark/tick.tsx';
import type { StationView } from '../types.ts';

/** Where an instrument has been, where it is, what is to come. */
export function Stations({ stations }: { stations: StationView[] }) {
  return (
    <ol className="stations">
      {stations.map((station) => (
        <li
          key={station.label}
          className={`station-${station.state}`}
          aria-current={station.state === 'here' ? 'step' : undefined}
        >
          <Tick state={station.state === 'done' ? 'aligned' : 'hollow'} />
          <span>{station.label}</span>
          <small>{station.when}</small>
        </li>
      ))}
    </ol>
  );
}

import type { ReactNode } from 'react';
import type { RailView } from '../types.ts';
import { Rail } from './rail.tsx';
import './tag.css';

interface Props {
  /** "Wednesday 15 April, 14:05. Eleven open cases." */
  sub: string;
  rails: RailView[];
  /** "Take in an instrument", and whose cases are shown. */
  takeIn?: ReactNode;
  whose?: ReactNode;
}

/** The staff's first page: open cases by what each waits for. */
export function Rack({ sub, rails, takeIn, whose }: Props) {
  const of = (name: RailView['rail']) => rails.find((rail) => rail.rail === name);
  const [bench, resting, owner, home] = [of('bench'), of('resting'), of('owner'), of('home')];
  return (
    <main className="mx-auto max-w-360 px-8 pt-5 pb-12 max-phone:px-4 max-phone:pt-4 max-phone:pb-30">
      <div className="mb-4 flex flex-wrap items-center gap-x-5 gap-y-1.5">
        <h1 className="leading-none max-phone:text-h1">Rack</h1>
        <p className="text-ink-2 max-phone:order-3 max-phone:w-full phone:pt-2">{sub}</p>
        <div className="ml-auto flex flex-wrap items-center gap-5">
          {takeIn && <div className="max-phone:hidden">{takeIn}</div>}
          {whose}
        </div>
      </div>
      <div className="grid gap-x-10 gap-y-4.5 max-phone:gap-y-6 case:grid-cols-2">
        {bench && <Rail rail={bench} />}
        {resting && <Rail rail={resting} />}
        {owner && <Rail rail={owner} half />}
        {home && <Rail rail={home} half />}
      </div>
    </main>
  );
}

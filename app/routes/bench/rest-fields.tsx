import { useState } from 'react';
import type { FieldOf } from '#app/lib/field-of.ts';
import { dayTime, weekTime } from '#app/lib/format/date.ts';
import { Stepper } from '#app/ui/add/stepper.tsx';
import { FigureField, TextField } from '#app/ui/control/text-field.tsx';
import { REST_CAUTION, REST_PRODUCTS } from '#domain/rest-products.ts';
import { restFacts, restTimes } from '#domain/rest-times.ts';

interface Hours {
  clampsOffHours: string;
  workedHours: string;
  stringsHours: string;
}

const NAMES = ['clampsOffHours', 'workedHours', 'stringsHours'] as const;

const asFacts = (hours: Hours, from: Date) => {
  const read = (text: string) => {
    const value = Number(text.replace(',', '.'));
    return text.trim() !== '' && value > 0 && value <= 2160 ? String(value) : null;
  };
  return restFacts(from, {
    clampsOffHours: read(hours.clampsOffHours),
    workedHours: read(hours.workedHours),
    stringsHours: read(hours.stringsHours),
  });
};

const step = (text: string, by: number) => String(Math.max(1, (Number(text) || 0) + by));

interface Props {
  field: FieldOf;
  /** When the rest starts, for the words; ISO. */
  from: string;
  zone: string;
}

/** A rest: its product, and up to three times in hours; the first is on two keys. */
export function RestFields({ field, from, zone }: Props) {
  const [product, setProduct] = useState(field('draft.rest.product').defaultValue);
  const [hours, setHours] = useState<Hours>({
    clampsOffHours: field('draft.rest.clampsOffHours').defaultValue,
    workedHours: field('draft.rest.workedHours').defaultValue,
    stringsHours: field('draft.rest.stringsHours').defaultValue,
  });
  const known = REST_PRODUCTS.find(({ name }) => name.toLowerCase() === product.toLowerCase());
  const choose = (name: string) => {
    setProduct(name);
    const found = REST_PRODUCTS.find((one) => one.name === name);
    if (found)
      setHours({
        clampsOffHours: found.clampsOffHours ?? '',
        workedHours: found.workedHours ?? '',
        stringsHours: found.stringsHours ?? '',
      });
  };
  const [first, ...then] = restTimes(asFacts(hours, new Date(from)));
  const key = NAMES.find((name) => hours[name] !== '') ?? 'clampsOffHours';
  const by = (amount: number) => setHours({ ...hours, [key]: step(hours[key], amount) });
  const hour = (name: keyof Hours, label: string) => (
    <FigureField
      label={label}
      name={`draft.rest.${name}`}
      value={hours[name]}
      onChange={(event) => setHours({ ...hours, [name]: event.currentTarget.value })}
      error={field(`draft.rest.${name}`).error}
    />
  );
  return (
    <div className="grid gap-4">
      <TextField
        label="What rests"
        name="draft.rest.product"
        list="rest-products"
        value={product}
        onChange={(event) => choose(event.currentTarget.value)}
        error={field('draft.rest.product').error}
      />
      <datalist id="rest-products">
        {REST_PRODUCTS.map(({ name }) => (
          <option key={name} value={name} />
        ))}
      </datalist>
      <Stepper
        label="Rest, hours"
        value={`${hours[key] || '0'}\u00a0h`}
        under={first ? `${first.name} ${dayTime(first.at, zone)}` : 'no time set yet'}
        less="One hour less"
        more="One hour more"
        onLess={() => by(-1)}
        onMore={() => by(1)}
      />
      <div className="grid grid-cols-3 gap-3">
        {hour('clampsOffHours', 'Clamps off, h')}
        {hour('workedHours', 'Worked, h')}
        {hour('stringsHours', 'Strings, h')}
      </div>
      <p className="text-label text-ink-2">
        {then.length > 0 &&
          `Then: ${then.map(({ name, at }) => `${name} ${weekTime(at, zone)}`).join(', ')}. `}
        {known?.note} {REST_CAUTION}
      </p>
    </div>
  );
}

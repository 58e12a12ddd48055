import { describe, expect, it } from 'vitest';
import type { Invalid } from './errors.ts';
import { parseInput } from './input.ts';
import { TakeInSchema } from './intake.ts';

const right = {
  owner: { id: '', name: 'Marguerite Osei', email: 'marguerite@osei.example', tellBy: 'email' },
  instrument: { id: '', kind: 'Parlour guitar', maker: 'Aldous Pike', serial: '0417' },
  job: 'Lifted bridge',
  complaint: 'It buzzes.',
  consentPhotos: 'on',
};

const fields = (input: unknown) => {
  try {
    parseInput(TakeInSchema, input);
  } catch (error) {
    return (error as Invalid).fields;
  }
  return {};
};

describe('taking in', () => {
  it('reads what the counter asks', () => {
    expect(parseInput(TakeInSchema, right)).toMatchObject({
      owner: { name: 'Marguerite Osei', telephone: null, address: null },
      bringer: null,
      payer: null,
      instrument: { serial: '0417', model: null },
      accessories: '',
      consentPhotos: true,
      publishWork: false,
      promisedOn: null,
      technicianId: null,
    });
  });

  it('says every missing field in its own place', () => {
    expect(Object.keys(fields({}))).toEqual([
      'owner.name',
      'owner.email',
      'instrument.kind',
      'instrument.maker',
      'job',
      'complaint',
    ]);
  });

  it('takes a known owner and a known instrument by their ids alone', () => {
    const id = '0199c4a2-7f00-7000-8000-000000000001';
    expect(
      parseInput(TakeInSchema, { ...right, owner: { id, name: '' }, instrument: { id } }),
    ).toMatchObject({
      owner: { id },
      instrument: { id },
    });
    expect(fields({ ...right, owner: { id: "1' OR '1" } })).toHaveProperty('owner.id');
  });

  it('refuses a very long serial with the count and what to do', () => {
    const serial = '0417'.repeat(100);
    expect(fields({ ...right, instrument: { ...right.instrument, serial } })).toEqual({
      'instrument.serial': 'The serial has 400 characters; 80 is the most. Shorten it.',
    });
  });

  it('needs a way to reach the owner, and the one they asked for', () => {
    const owner = (more: object) =>
      fields({ ...right, owner: { name: 'A', tellBy: 'email', ...more } });
    expect(owner({})).toHaveProperty('owner.email');
    expect(owner({ telephone: '555' })).toHaveProperty('owner.email');
    expect(owner({ email: 'a@b.example', tellBy: 'telephone' })).toHaveProperty('owner.telephone');
    expect(owner({ email: 'a@b.example\r\nBcc: c@d.example' })).toHaveProperty('owner.email');
    expect(owner({ telephone: '555', tellBy: 'telephone' })).toEqual({});
  });

  it('leaves bringer and payer to the owner unless something is filled in', () => {
    const empty = { id: '', name: ' ', email: '', telephone: '', address: '', tellBy: 'email' };
    expect(parseInput(TakeInSchema, { ...right, bringer: empty, payer: empty })).toMatchObject({
      bringer: null,
      payer: null,
    });
    expect(fields({ ...right, payer: { ...empty, name: 'Saltmere Sinfonia' } })).toHaveProperty(
      'payer.email',
    );
    expect(
      parseInput(TakeInSchema, { ...right, payer: { ...empty, name: 'S', email: 's@s.example' } })
        .payer,
    ).toMatchObject({ name: 'S' });
  });

  it.each(['2026-02-30', '24.4.2026', 'soon', '1969-01-01'])(
    'refuses %s as a promised day',
    (promisedOn) => {
      expect(fields({ ...right, promisedOn })).toHaveProperty('promisedOn');
    },
  );
});

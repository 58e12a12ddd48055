import { describe, expect, it } from 'vitest';
import { readForm, textsOf } from './read-form.ts';

const form = (...pairs: [string, string][]) => {
  const made = new FormData();
  for (const [name, value] of pairs) made.append(name, value);
  return made;
};

describe('a form as sent', () => {
  it('is nested by its dots, with lists where the names are numbers', () => {
    expect(
      readForm(
        form(
          ['owner.name', 'Marguerite Osei'],
          ['photos.0.caption', 'Front'],
          ['photos.0.visibility', 'shared'],
          ['photos.1.caption', 'Back'],
          ['takeOff', 'a'],
          ['takeOff', 'b'],
          ['job', ''],
        ),
      ),
    ).toEqual({
      owner: { name: 'Marguerite Osei' },
      photos: [{ caption: 'Front', visibility: 'shared' }, { caption: 'Back' }],
      takeOff: ['a', 'b'],
      job: '',
    });
  });

  it('leaves out files, odd names and attempts at the prototype', () => {
    const sent = form(
      ['__proto__.polluted', 'x'],
      ['a..b', 'x'],
      ['constructor', 'kept'],
      ['', 'x'],
    );
    sent.append('file', new Blob(['x']), 'x.jpg');
    expect(readForm(sent)).toEqual({ constructor: 'kept' });
    expect(({} as { polluted?: string }).polluted).toBeUndefined();
  });

  it('survives a name that is text and branch at once', () => {
    expect(readForm(form(['a', '1'], ['a.b', '2']))).toEqual({ a: { b: '2' } });
    expect(readForm(form(['a.b', '2'], ['a', '1']))).toEqual({ a: { b: '2' } });
  });

  it('can be filled in again', () => {
    expect(textsOf(form(['owner.name', 'X'], ['job', 'Y']))).toEqual({
      'owner.name': 'X',
      job: 'Y',
    });
  });
});

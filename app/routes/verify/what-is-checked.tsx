import { Link } from 'react-router';
import { PublicFrame } from './frame.tsx';

/** A trick somebody may try, what shows it, and what nothing here can show. */
interface Trick {
  who: string;
  tries: string;
  shows: string;
  not: string;
}

const TRICKS: Trick[] = [
  {
    who: 'The shop',
    tries: 'makes the record up afterwards',
    shows:
      'Each entry stands between two time-stamps of an outside authority. Where a record has none yet, its page says so.',
    not: 'A false story that was told at the time.',
  },
  {
    who: 'The shop',
    tries: 'leaves out an entry it does not like',
    shows:
      'The entries of a case are numbered and each names the one before, those kept by the shop too. The close lists them all.',
    not: 'What was never written down.',
  },
  {
    who: 'The shop',
    tries: 'changes sealed entries or their order',
    shows: 'The log’s signed heads are in other people’s hands: on papers and in mails.',
    not: 'Nothing of this kind stays hidden from whoever compares.',
  },
  {
    who: 'The shop',
    tries: 'shows different people different records',
    shows: 'Any two signed heads must fit together, whoever holds them.',
    not: 'Two records, as long as nobody compares.',
  },
  {
    who: 'A thief with the database',
    tries: 'alters it',
    shows: 'The shop compares it with heads that are kept outside of it.',
    not: 'Reading what is in it.',
  },
  {
    who: 'A page that looks like this one',
    tries: 'says Intact',
    shows: 'Type the address that is printed on the paper; do not follow a link from a stranger.',
    not: 'A visitor who trusts any page.',
  },
  {
    who: 'A curious buyer',
    tries: 'learns who the owner is, or what it cost',
    shows: 'Names and prices are in parts of their own that are not given out.',
    not: 'What the owner tells them.',
  },
  {
    who: 'The shop',
    tries: 'keeps a withdrawal back, or keeps two records of one case',
    shows:
      'Every entry takes a place in the public log that whoever holds the record can look for.',
    not: 'Entries made after the log head in hand.',
  },
  {
    who: 'A forger',
    tries: 'prints a warranty with keys of their own',
    shows: 'The key is the one published at this address, not the one the paper names.',
    not: 'A reader who takes the key from the paper.',
  },
  {
    who: 'The shop',
    tries: 'names its own time-stamps like those of a known authority',
    shows: 'Authorities are known by their keys; an unknown one is called unknown.',
    not: 'An authority that is not on the list: “authority not known here”.',
  },
];

export default function WhatIsCheckedPage() {
  return (
    <PublicFrame current="what-is-checked">
      <title>What is checked · Witnessmark</title>
      <main className="mx-auto max-w-[52rem] px-8 pt-10 pb-20 max-phone:px-4">
        <h1>What this record cannot prove</h1>
        <p className="mt-4 text-note">
          A warranty from this shop can be checked by anyone. What is checked is whether anything
          has been changed since the shop sealed it, and by whose key. That the work was good, and
          that what was written down is true, no check can say.
        </p>
        <h2 className="mt-10">What is checked here</h2>
        <p className="mt-2 text-note">
          The page fetches the record of the number you type and checks it in your browser: every
          hash, every signature, each entry’s place in the public log, and that nothing later is in
          it. The PDF you drop is compared byte for byte with what was sealed; it is not sent. A
          number alone proves nothing, because numbers can be copied: then the page asks you to
          compare the lines.
        </p>
        <p className="mt-2 text-note">
          The signature inside the PDF is for PDF readers: they confirm that the file was not
          changed. They do not know the shop and say so. This page does not go by it.
        </p>
        <h2 className="mt-10">What is the shop’s word</h2>
        <p className="mt-2 text-note">
          Whether a warranty is in force, suspended or withdrawn is what the shop says today,
          signed. When something was sealed is the shop’s clock, until an outside time-stamp covers
          it.
        </p>
        <h2 className="mt-10">Who might lie, and what shows it</h2>
        <ul className="mt-4 grid gap-4">
          {TRICKS.map(({ who, tries, shows, not }) => (
            <li key={who + tries} className="panel p-5">
              <h3>
                {who} {tries}
              </h3>
              <p className="mt-2">
                <b>What shows it:</b> {shows}
              </p>
              <p className="mt-1 text-ink-2">
                <b>What nothing here shows:</b> {not}
              </p>
            </li>
          ))}
        </ul>
        <p className="mt-8">
          <Link to="/log">The log, its keys and its entries</Link>
        </p>
      </main>
    </PublicFrame>
  );
}

export function loader() {
  return null;
}

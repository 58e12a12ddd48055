import type { PaperFacts } from './paper-facts.ts';

/** A heading of the second page with its text. */
export interface Section {
  heading: string;
  text: string;
}

/** The terms on the first page, in short. */
export function termsInShort({ term, lastDay, shop }: PaperFacts): string[] {
  return [
    `For ${term}, to ${lastDay}, we put right at our cost any of this work that fails in ordinary playing and keeping. The warranty goes with the instrument to a later owner.`,
    shop.conditions,
  ].filter((text) => text !== '');
}

/**
 * The terms in full. The headings are those a written warranty needs (16 CFR 701.3(a); Directive (EU)
 * 2019/771, art. 17): what and who is covered, what is done, start and length, how to claim, rights by
 * law. Local law decides; the shop is told so on screen.
 */
export function termsInFull(facts: PaperFacts): Section[] {
  const { shop, owner, code, starts, lastDay } = facts;
  return [
    {
      heading: 'What this is',
      text: `A limited warranty given by ${shop.name}, ${shop.address}, on the repair named on page 1. It is limited because it covers that work and not the whole instrument.`,
    },
    {
      heading: 'Who is covered',
      text: `${owner}, and after that each later owner of the instrument within the term. A later owner shows this paper or its number; nothing has to be registered.`,
    },
    {
      heading: 'What is covered',
      text: 'The covered work on page 1, and the parts that were fitted for it. Strings, wear, and anything not named there are outside it.',
    },
    {
      heading: 'What we will do',
      text: 'We look at it within 14 days of its coming in and say in writing what we found. If covered work has failed, we do that work again at our cost, parts included. If it cannot be done again, we give back what was paid for it.',
    },
    {
      heading: 'Start and length',
      text: `It starts on ${starts} and ends at the end of ${lastDay}. Work done again under it is covered to the same day, and for 6 months at least.`,
    },
    {
      heading: 'How to claim',
      text: `Bring or send the instrument to ${shop.address}, with the number ${code}. Telephone ${shop.telephone} first if you send it, and slacken the strings. We pay the way back when the claim is right. Tell us within 60 days of noticing the fault.`,
    },
    {
      heading: 'What is not covered',
      text: [shop.conditions, 'We do not pay for loss of use, unless the law says we must.']
        .filter((text) => text !== '')
        .join(' '),
    },
    {
      heading: 'Your rights by law',
      text: 'The law gives you rights against us when work is not done with care or goods are not as they should be. This warranty is added to those rights, free of charge; it takes none of them away and does not shorten them. They may vary from place to place.',
    },
  ];
}

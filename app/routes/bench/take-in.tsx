import { useRef } from 'react';
import { Form, redirect } from 'react-router';
import { validate } from 'uuid';
import type { Route } from './+types/take-in';
import { viewerContext } from '#app/context.ts';
import { fieldsOf } from '#app/lib/field-of.ts';
import { dateYear } from '#app/lib/format/date.ts';
import { refuse } from '#app/lib/problem.ts';
import { readForm } from '#app/lib/read-form.ts';
import { retry } from '#app/lib/retry.ts';
import { Button } from '#app/ui/control/button.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import { useFirstWrongField } from '#app/ui/control/use-first-wrong-field.ts';
import { Notice } from '#app/ui/notice.tsx';
import { kindInSentence } from '#domain/instrument-kinds.ts';
import { takeIn } from '#server/cases/take-in.ts';
import { findCustomers } from '#server/customers/find-customers.ts';
import { readCustomer } from '#server/customers/read-customer.ts';
import { findBySerial } from '#server/instruments/find-by-serial.ts';
import {
  listInstrumentsOf,
  type KnownInstrument,
} from '#server/instruments/list-instruments-of.ts';
import { listPeople } from '#server/shop/list-people.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { CaseSections } from './take-in-case.tsx';
import { InstrumentSection, type KnownInstrumentView } from './take-in-instrument.tsx';
import { FindOwner, OwnerSection } from './take-in-owner.tsx';

function knownView(known: KnownInstrument, zone: string): KnownInstrumentView {
  const { id, kind, maker, serial, cases } = known;
  return {
    id,
    name: [kind, maker, serial].filter((part) => part !== null).join(', '),
    cases: cases.map(
      ({ number, job, takenInAt }) =>
        `${number}, ${kindInSentence(job)}, ${dateYear(takenInAt, zone)}`,
    ),
  };
}

export async function loader({ context, url }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const asked = (name: string) => url.searchParams.get(name)?.slice(0, 160) ?? '';
  const ownerId = validate(asked('owner')) ? asked('owner') : null;
  const [shop, people, found, owner, known, bySerial] = await Promise.all([
    readShop(),
    listPeople(viewer),
    findCustomers(viewer, { words: asked('find') }),
    ownerId === null ? null : readCustomer(viewer, { id: ownerId }),
    ownerId === null ? [] : listInstrumentsOf(viewer, { ownerId }),
    findBySerial(viewer, { serial: asked('serial'), ownerId }),
  ]).catch(refuse);
  return {
    search: { words: asked('find'), found },
    owner,
    known: known.map((one) => knownView(one, shop.timeZone)),
    serial: asked('serial'),
    chosen: bySerial.same[0]?.id ?? '',
    asksForProof: bySerial.asksForProof,
    currency: shop.currency,
    people: people
      .filter(({ role }) => role !== 'desk')
      .map(({ id, name }) => ({ value: id, label: name })),
  };
}

export async function action({ context, request }: Route.ActionArgs) {
  const form = await request.formData();
  try {
    const { number } = await takeIn(context.get(viewerContext), readForm(form));
    return redirect(`/bench/cases/${number}?taken-in`);
  } catch (error) {
    return retry(error, form);
  }
}

export default function TakeInPage({ loaderData, actionData }: Route.ComponentProps) {
  const { search, owner, serial, ...instrument } = loaderData;
  const form = useRef<HTMLFormElement>(null);
  useFirstWrongField(form, actionData);
  const field = fieldsOf(actionData);
  const wrong = Object.keys(actionData?.fields ?? {}).length;
  return (
    <main className="mx-auto max-w-[60rem] px-8 pt-6 pb-20 max-phone:px-4" aria-label="Take in">
      <title>Take in an instrument · Witnessmark</title>
      <h1 className="mb-6">Take in an instrument</h1>
      {!owner && <FindOwner {...search} />}
      {owner && (
        <Form
          className="mb-7 flex flex-wrap items-end gap-3"
          role="search"
          aria-label="Serials"
          preventScrollReset
        >
          <input type="hidden" name="owner" value={owner.id} />
          <div className="min-w-0 flex-1 basis-64">
            <TextField
              label="Its serial"
              help="Shows whether it was here before."
              name="serial"
              mono
              defaultValue={serial}
              maxLength={80}
            />
          </div>
          <div className="pb-7">
            <Button icon="search">Look it up</Button>
          </div>
        </Form>
      )}
      <Form method="post" ref={form} noValidate>
        {actionData && (
          <Notice tone="failed" lead={actionData.problem} className="mb-6" alert>
            {wrong > 1 && `${wrong} fields need another look.`}
          </Notice>
        )}
        <OwnerSection owner={owner} field={field} />
        {/* A serial looked up chooses its instrument: the choice starts anew with it. */}
        <InstrumentSection
          key={serial + instrument.chosen}
          serial={serial}
          {...instrument}
          field={field}
        />
        <CaseSections people={loaderData.people} field={field} />
        <div className="border-t border-line pt-7">
          <Button kind="primary" size="big" className="max-phone:w-full">
            Take it in
          </Button>
          <p className="mt-2 text-label text-ink-2">
            It gets its number, and the owner a receipt by e-mail.
          </p>
        </div>
      </Form>
    </main>
  );
}

import { Form } from 'react-router';
import type { ProblemView } from '#app/lib/problem.ts';
import { Button } from '#app/ui/control/button.tsx';
import { FigureField } from '#app/ui/control/text-field.tsx';
import { Notice } from '#app/ui/notice.tsx';
import type { DrawnView } from './warranty-view.ts';

/** The lines that are ticked, with the months, as the form sends them. */
export function issueInput(form: FormData) {
  const text = (name: string) => {
    const value = form.get(name);
    return typeof value === 'string' ? value : '';
  };
  const lines = form.getAll('line').filter((line) => typeof line === 'string');
  return {
    months: text('months'),
    work: lines.flatMap((line) =>
      text(`text-${line}`).trim() === '' && line === 'own'
        ? []
        : [{ text: text(`text-${line}`), personId: text(`person-${line}`) }],
    ),
  };
}

interface Props {
  drawn: DrawnView;
  people: { id: string; name: string }[];
  problem: Pick<ProblemView, 'fields'> | undefined;
}

interface LineProps {
  line: string;
  text: string;
  personId: string;
  ticked: boolean;
  people: Props['people'];
  error: string | undefined;
}

function Line({ line, text, personId, ticked, people, error }: LineProps) {
  const what = line === 'own' ? 'A line of your own' : `Line ${Number(line) + 1}`;
  return (
    <li className="flex flex-wrap items-center gap-3 border-t border-line py-2">
      {line === 'own' && (
        <span className="basis-full text-label text-ink-3">
          A line of your own, if one is missing
        </span>
      )}
      <label className="flex min-h-11 items-center gap-2">
        <input type="checkbox" name="line" value={line} defaultChecked={ticked} />
        <span className="sr-only">{what}: covered</span>
      </label>
      <input
        name={`text-${line}`}
        defaultValue={text}
        aria-label={`${what}: what was done`}
        aria-invalid={error !== undefined}
        maxLength={160}
        className="input min-w-0 flex-1"
      />
      <select
        name={`person-${line}`}
        defaultValue={personId}
        aria-label={`${what}: who did it`}
        className="input w-auto"
      >
        {people.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </select>
      {error !== undefined && <p className="basis-full text-madder">{error}</p>}
    </li>
  );
}

/** What the warranty is to say: lines drawn from the case, to be chosen and changed, and its term. */
export function IssueForm({ drawn, people, problem }: Props) {
  const fields = problem?.fields ?? {};
  const { lines, months, starts, ends, owner } = drawn;
  return (
    <Form method="post" className="panel mt-5 grid gap-5 p-6 max-phone:p-4">
      <p className="text-note">
        Drawn from the sealed entries. Keep what the warranty is to cover, in words {owner} and a
        later owner understand.
      </p>
      <fieldset>
        <legend className="text-h3">Covered work</legend>
        {fields.work !== undefined && <p className="text-madder">{fields.work}</p>}
        <ul className="mt-2">
          {lines.map(({ text, personId, proposed }, at) => (
            <Line
              key={`${at}-${text}`}
              line={String(at)}
              text={text}
              personId={personId}
              ticked={proposed}
              people={people}
              error={fields[`work.${at}.text`]}
            />
          ))}
          <Line
            line="own"
            text=""
            personId={people[0]?.id ?? ''}
            ticked={false}
            people={people}
            error={undefined}
          />
        </ul>
      </fieldset>
      <FigureField
        label="Term, months"
        name="months"
        defaultValue={String(months)}
        help={`24 months begin on ${starts} and end with ${ends}. Common practice, no source.`}
        error={fields.months}
      />
      <Notice tone="waiting" icon="note" lead="Check local law.">
        What a written warranty must say, and what it may leave out, differs from place to place.
        Read the terms on page 2 of the paper before the first one goes out.
      </Notice>
      <Button kind="primary" size="big" wide>
        Issue the warranty
      </Button>
    </Form>
  );
}

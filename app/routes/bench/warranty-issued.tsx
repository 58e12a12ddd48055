import { ButtonLink } from '#app/ui/control/button.tsx';
import { Rosette } from '#app/ui/mark/rosette.tsx';
import { Tick } from '#app/ui/mark/tick.tsx';
import type { IssuedView } from './warranty-view.ts';

function Steps({ steps }: { steps: IssuedView['steps'] }) {
  return (
    <section className="panel mt-5 p-5" aria-labelledby="steps">
      <h2 id="steps" className="text-h3">
        Being issued
      </h2>
      <p className="mt-1 text-ink-2">
        This page follows by itself. If something outside does not answer, it is tried again until
        it does.
      </p>
      <ol className="mt-3 grid gap-2">
        {steps.map(({ name, label, done }) => (
          <li key={name} className="flex items-center gap-3">
            <Tick state={done ? 'aligned' : 'hollow'} />
            {label}
            <span className="text-ink-3">{done ? '' : 'to come'}</span>
          </li>
        ))}
      </ol>
    </section>
  );
}

/** A warranty of a case as the shop sees it: on its way, or handed out. */
export function IssuedWarranty({ issued }: { issued: IssuedView }) {
  const { code, isIssued, standing, term, work, by, seal, sealValue, paper, check, steps } = issued;
  return (
    <>
      {!isIssued && <Steps steps={steps} />}
      <section className="panel mt-5 p-6 max-phone:p-4" aria-label="What it says">
        <p className="text-label text-ink-3">Warranty number</p>
        <p className="font-mono text-h3">{code}</p>
        {standing && (
          <p className="mt-1">
            Standing: <b>{standing}</b>
          </p>
        )}
        <p className="mt-3">{term}.</p>
        <table className="mt-3 w-full">
          <caption className="sr-only">Covered work</caption>
          <thead>
            <tr>
              <th scope="col" className="text-left">
                Covered work
              </th>
              <th scope="col" className="text-left">
                By
              </th>
            </tr>
          </thead>
          <tbody>
            {work.map(({ text, name }) => (
              <tr key={text + name}>
                <td>{text}</td>
                <td>{name}</td>
              </tr>
            ))}
          </tbody>
        </table>
        <p className="mt-3 text-ink-2">{by}.</p>
        {seal && sealValue && (
          <div className="mt-5 flex flex-wrap items-center gap-5 text-verdigris">
            <Rosette sealValue={sealValue} />
            <p className="min-w-0 flex-1 text-ink-2">
              Seal value
              <code className="block [overflow-wrap:anywhere]">{seal}</code>
            </p>
          </div>
        )}
        {paper && (
          <p className="mt-6 flex flex-wrap gap-3">
            <ButtonLink to={paper} kind="primary" reloadDocument>
              Open the PDF
            </ButtonLink>
            <ButtonLink to={check}>Check it as a stranger would</ButtonLink>
          </p>
        )}
      </section>
    </>
  );
}

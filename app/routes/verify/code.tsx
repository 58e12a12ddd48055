import { useEffect, useState } from 'react';
import { data, redirect } from 'react-router';
import type { Route } from './+types/code';
import { refuse } from '#app/lib/problem.ts';
import { Notice } from '#app/ui/notice.tsx';
import { CheckRows } from '#app/ui/verify/check-rows.tsx';
import { SealedCard } from '#app/ui/verify/sealed-card.tsx';
import { Standing } from '#app/ui/verify/standing.tsx';
import { Verdict } from '#app/ui/verify/verdict.tsx';
import { VerifyAsk } from '#app/ui/verify/verify-ask.tsx';
import { VerifyPage } from '#app/ui/verify/verify-page.tsx';
import { CodeError } from '#evidence/errors.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import { parseCode } from '#evidence/code/parse-code.ts';
import { requestContext } from '#server/http/context.ts';
import { knownNumber, whoAnswers } from '#server/warranty/known-number.ts';
import type { Checked } from './check-here.ts';
import { knownView, type KnownView } from './known-view.ts';
import { PublicFrame } from './frame.tsx';
import { takePaper, type HeldPaper } from './held-paper.ts';
import { PaperDrop } from './paper-drop.tsx';
import { checkedStanding } from './standing-view.ts';

const NOT_ISSUED =
  'This shop has not issued this number. Look at each letter and figure once more; 0 and O, 1 and I are read alike.';

function notKnown(typed: string, sentence: string) {
  const nobody = {
    code: null,
    number: typed,
    known: null,
    sentence,
    shop: '',
    place: '',
    zone: '',
  };
  return data(nobody, { status: 404 });
}

export async function loader({ params, context }: Route.LoaderArgs) {
  let code: string;
  try {
    code = parseCode(params.code);
  } catch (error) {
    if (error instanceof CodeError) return notKnown(params.code, error.message);
    throw error;
  }
  if (code !== params.code) throw redirect(`/verify/${code}`);
  const { ip } = context.get(requestContext);
  const [known, who] = await Promise.all([knownNumber({ code, ip }), whoAnswers()]).catch(refuse);
  if (!known) return notKnown(formatCode(code), NOT_ISSUED);
  return data({
    code,
    number: formatCode(code),
    known: knownView(formatCode(code), known, who.zone),
    sentence: 'Known. Your paper has not been checked: compare these lines with it.',
    ...who,
  });
}

type View = Route.ComponentProps['loaderData'];
type State = { at: 'server' } | { at: 'checking' } | { at: 'done'; checked: Checked } | Failed;
type Failed = { at: 'failed'; problem: string };

/** Checks what is held whenever it changes; the code that does it is fetched only here. */
function useCheck({ code, shop, zone }: View, paper: HeldPaper | null): State {
  const [state, setState] = useState<State>({ at: 'server' });
  useEffect(() => {
    if (code === null) return;
    let left = false;
    const show = (next: State) => (left ? undefined : setState(next));
    show({ at: 'checking' });
    const { host, hash: fragment } = window.location;
    void import('./check-here.ts')
      .then(({ checkHere }) => checkHere({ code, fragment, paper }, { host, shop, zone }))
      .then((checked) =>
        show(checked ? { at: 'done', checked } : { at: 'failed', problem: NOT_ISSUED }),
      )
      .catch((error: unknown) =>
        show({ at: 'failed', problem: error instanceof Error ? error.message : String(error) }),
      );
    return () => {
      left = true;
    };
  }, [code, shop, zone, paper]);
  return state;
}

export default function VerifyCodePage({ loaderData }: Route.ComponentProps) {
  // Another number begins anew, with no file in hand but one that was dropped for it.
  return <Answer key={loaderData.number} loaderData={loaderData} />;
}

function Answer({ loaderData }: { loaderData: View }) {
  const [paper, setPaper] = useState<HeldPaper | null>(takePaper);
  const state = useCheck(loaderData, paper);
  const ask = (
    <VerifyAsk action="/verify" number={loaderData.number}>
      <PaperDrop name={paper?.name ?? null} onPaper={setPaper} />
    </VerifyAsk>
  );
  return (
    <PublicFrame>
      <title>{`Verify ${loaderData.number} · Witnessmark`}</title>
      {loaderData.known ? (
        <Known view={loaderData} known={loaderData.known} state={state} ask={ask} />
      ) : (
        <VerifyPage
          kind="not-known"
          ask={ask}
          foot={
            <Notice tone="plain" lead="Only this shop’s numbers are known here.">
              If another shop’s name stands on the paper, check it at the address printed there.
            </Notice>
          }
        >
          <Verdict kind="not-known" sentence={loaderData.sentence} />
        </VerifyPage>
      )}
    </PublicFrame>
  );
}

interface KnownProps {
  view: View;
  known: KnownView;
  state: State;
  ask: React.ReactNode;
}

function Known({ view, known, state, ask }: KnownProps) {
  const checked = state.at === 'done' ? state.checked : null;
  const kind = checked?.kind ?? 'not-fully-checked';
  const subject = checked?.subject ?? known.subject;
  const standing = checked
    ? checkedStanding(checked, known, view.zone)
    : { shown: known.standing, missing: null };
  return (
    <VerifyPage
      kind={kind}
      ask={ask}
      foot={
        <div className="verify-foot">
          {kind === 'does-not-match' && (
            <Notice tone="failed" lead="Do not rely on what does not match.">
              Ask {view.shop} in {view.place} for a fresh copy.
            </Notice>
          )}
          {subject ? (
            <SealedCard
              title={subject.instrument}
              text={`${subject.work}. ${subject.term}.`}
              sealValue={checked?.sealValue ?? known.sealValue}
              rosetteWords="Compare the rosette printed on your page with this one; the seal value decides."
            />
          ) : (
            <Notice tone="plain" lead="The owner lets only number and standing be shown.">
              Drop the PDF: the record in it says what was repaired, and is checked here.
            </Notice>
          )}
        </div>
      }
    >
      <Verdict
        kind={kind}
        sentence={checked?.sentence ?? view.sentence}
        arrive={checked !== null}
      />
      {standing.shown && <Standing standing={standing.shown} />}
      {standing.missing && (
        <Notice tone="plain" lead="Standing">
          {standing.missing}
        </Notice>
      )}
      <CheckRows
        {...(checked
          ? {}
          : { heads: { held: 'What your paper should say', found: 'What was checked here' } })}
        rows={checked?.rows ?? [...known.rows, notChecked(state)]}
      />
    </VerifyPage>
  );
}

function notChecked(state: State) {
  const words =
    state.at === 'failed'
      ? { word: 'Not checked', note: state.problem }
      : state.at === 'checking'
        ? { word: 'Checking', note: 'the record is being read here' }
        : {
            word: 'Not checked in your browser',
            note: 'that needs JavaScript; until then this is the shop’s word',
          };
  return { held: 'The shop’s record', result: 'open' as const, ...words };
}

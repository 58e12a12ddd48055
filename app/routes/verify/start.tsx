import { useState } from 'react';
import { redirect, useNavigate } from 'react-router';
import type { Route } from './+types/start';
import { VerifyStart } from '#app/ui/verify/verify-start.tsx';
import { CodeError } from '#evidence/errors.ts';
import { parseCode } from '#evidence/code/parse-code.ts';
import { PublicFrame } from './frame.tsx';
import { holdPaper, type HeldPaper } from './held-paper.ts';
import { PaperDrop } from './paper-drop.tsx';

export function loader({ url }: Route.LoaderArgs) {
  const number = url.searchParams.get('number');
  if (number === null) return { number: null, error: null };
  try {
    throw redirect(`/verify/${parseCode(number)}`);
  } catch (error) {
    if (error instanceof CodeError) return { number, error: error.message };
    throw error;
  }
}

const NO_RECORD =
  'There is no record of a warranty in this file. Type the number from the paper instead.';

/** The number in a dropped paper, so that it can be asked about. */
async function codeIn(paper: HeldPaper): Promise<string | null> {
  const { readPaperCode } = await import('./read-paper-code.ts');
  return readPaperCode(paper.bytes);
}

export default function VerifyStartPage({ loaderData }: Route.ComponentProps) {
  const navigate = useNavigate();
  const [problem, setProblem] = useState<string | null>(null);
  const onPaper = async (paper: HeldPaper) => {
    const code = await codeIn(paper);
    if (code === null) return setProblem(NO_RECORD);
    holdPaper(paper);
    await navigate(`/verify/${code}`);
  };
  return (
    <PublicFrame>
      <title>Verify · Witnessmark</title>
      <VerifyStart
        action="/verify"
        number={loaderData.number ?? ''}
        {...(loaderData.error === null ? {} : { error: loaderData.error })}
        text="Check a repair warranty against what the shop sealed. Nothing you drop here leaves this device."
      >
        <p className="text-center text-ink-3">or</p>
        <PaperDrop name={null} onPaper={(paper) => void onPaper(paper)} big />
        {problem !== null && (
          <p role="alert" className="text-madder">
            {problem}
          </p>
        )}
      </VerifyStart>
    </PublicFrame>
  );
}

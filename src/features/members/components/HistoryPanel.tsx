import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { verifyMember } from '#shared/contracts/members.ts';
import type { Member } from '#shared/basis/schema/index.ts';
import { Button } from '#src/components/Button.tsx';
import { Notice, ProblemNotice } from '#src/components/Notice.tsx';
import { Section } from '#src/components/Section.tsx';
import { VerdictMark } from '#src/components/StateMark.tsx';
import { call } from '#src/lib/api/call.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { moment } from '#src/lib/format/time.ts';
import { useVersions } from '../api/useMember.ts';

interface HistoryPanelProps {
  member: string;
  hasResult: boolean;
  readOnly: boolean;
  onRestore: (document: Member) => void;
}

/** Every save with who and when; one can be taken back onto the sheet. And the proof of the stored result. */
export function HistoryPanel({ member, hasResult, readOnly, onRestore }: HistoryPanelProps) {
  const [shown, setShown] = useState(false);
  const versions = useVersions(member, shown);
  const verify = useMutation({ mutationFn: () => call(verifyMember, { params: { id: member } }) });
  const numbers = useNumbers();
  return (
    <Section
      title="Record"
      note="every save, and the stored result"
      actions={
        <>
          {hasResult && (
            <Button kind="quiet" onClick={() => verify.mutate()} disabled={verify.isPending}>
              {verify.isPending ? 'Recomputing …' : 'Verify the stored result'}
            </Button>
          )}
          <Button kind="quiet" onClick={() => setShown(!shown)} aria-expanded={shown}>
            {shown ? 'Hide the saves' : 'Show the saves'}
          </Button>
        </>
      }
    >
      <ProblemNotice error={verify.error} />
      {verify.data &&
        (verify.data.same ? (
          <Notice>
            The stored result was recomputed from its stored inputs and is the same to the last byte (
            {verify.data.storedHash.slice(0, 12)}…, engine {verify.data.engine}).
          </Notice>
        ) : (
          <Notice tone="error">
            The recomputed result differs from the stored one.
            <ul className="list-disc pl-5">
              {verify.data.differences.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          </Notice>
        ))}
      {shown && (
        <>
          <ProblemNotice error={versions.error} />
          <table className="w-full text-sm">
            <caption className="sr-only">Saves, newest first</caption>
            <thead>
              <tr className="border-b border-ink text-left text-xs text-soft">
                <th scope="col" className="py-1 font-normal">
                  Version
                </th>
                <th scope="col" className="py-1 font-normal">
                  Saved
                </th>
                <th scope="col" className="py-1 font-normal">
                  By
                </th>
                <th scope="col" className="py-1 font-normal">
                  Verdict
                </th>
                <th scope="col" className="py-1 text-right font-normal">
                  Utilisation
                </th>
                <th scope="col" className="py-1">
                  <span className="sr-only">Restore</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {versions.data?.items.map((item) => (
                <tr key={item.version} className="border-b border-rule">
                  <th scope="row" className="py-1 text-left font-mono font-normal">
                    {item.version}
                  </th>
                  <td className="py-1">{moment(item.savedAt)}</td>
                  <td className="py-1">{item.savedBy.name}</td>
                  <td className="py-1">{item.result ? <VerdictMark word={item.result.word} /> : '–'}</td>
                  <td className="py-1 text-right font-mono tabular-nums">
                    {typeof item.result?.utilisation === 'number'
                      ? numbers.decimals(item.result.utilisation, 2)
                      : '–'}
                  </td>
                  <td className="py-1 text-right">
                    {!readOnly && (
                      <Button
                        kind="quiet"
                        onClick={() => onRestore(item.document)}
                        aria-label={`Take version ${item.version} onto the sheet`}
                      >
                        Take back
                      </Button>
                    )}
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </>
      )}
    </Section>
  );
}

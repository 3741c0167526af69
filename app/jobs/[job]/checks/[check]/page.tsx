import type { Metadata } from 'next';
import { Page } from '@/app/components/page-layout';
import { orRefuse, requireActor } from '@/app/session';
import { categoryWords } from '@/lib/model/independence';
import { openCheck } from '@/lib/services/open-check';
import { NewerNote } from '../../revisions/[revision]/newer-note';
import { answer, askAboutBasis, beginOwn, compareOwn, conclude, leaveMark, settle, verify } from './actions';
import { BlindDesk } from './blind-desk';
import { CheckDesk } from './check-desk';
import { showMarks } from './show-marks';
import '../../revisions/[revision]/revision.css';

interface Props {
  params: Promise<{ job: string; check: string }>;
}

export const metadata: Metadata = { title: 'Check' };

/** The checker's screen: marks in the page's own margin, the line in hand beside it. */
export default async function CheckPage({ params }: Props) {
  const actor = await requireActor();
  const { check: id } = await params;
  const { job, revision, newer, blocks, check, marks, earlier, inputs, own, basis } = await orRefuse(
    openCheck(actor, id),
  );
  const path = `/jobs/${job.id}/checks/${id}`;
  return (
    <Page
      actor={actor}
      path={[
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: `${revision.sheet} ${revision.title}`, href: `/jobs/${job.id}/revisions/${revision.id}` },
        { label: 'Check' },
      ]}
      margin={
        <>
          <div className="bigno">{revision.sheet}</div>
          <div className="under">revision {revision.number}</div>
        </>
      }
      foot={[
        actor.officeName,
        job.number,
        revision.sheet,
        `rev ${revision.number}`,
        `checker ${check.checker}`,
        categoryWords(check.category),
      ]}
    >
      {check.hidden ? (
        <BlindDesk
          title={`Check of ${revision.sheet} ${revision.title}, revision ${revision.number}`}
          basis={basis}
          own={
            own && {
              name: own.name,
              href: `/jobs/${job.id}/sheets/${own.sheetId}`,
              frozen: own.revision?.number,
            }
          }
          open={check.state === 'open'}
          marks={showMarks(marks, actor.zone)}
          onBegin={beginOwn.bind(null, id)}
          onCompare={compareOwn.bind(null, path, id)}
          onAsk={askAboutBasis.bind(null, path, id)}
          onSettle={settle.bind(null, path)}
          onConclude={conclude.bind(null, path, id)}
          category={check.category}
        />
      ) : (
        <CheckDesk
          title={`${revision.sheet} ${revision.title}, revision ${revision.number}`}
          blocks={blocks}
          check={{ ...check, checker: check.checker ?? '' }}
          marks={showMarks(marks, actor.zone)}
          earlier={earlier}
          inputs={{ href: `${path}/inputs`, all: inputs.length, asked: check.inputsAsked }}
          onMark={leaveMark.bind(null, path, id)}
          onConclude={conclude.bind(null, path, id)}
          onAnswer={answer.bind(null, path)}
          onSettle={settle.bind(null, path)}
          onVerify={verify.bind(null, path, id)}
          mayAnswer={revision.originatorId === actor.personId}
          notice={newer ? <NewerNote jobId={job.id} newer={newer} zone={actor.zone} /> : null}
          certificate={`${path}/certificate`}
          comparison={own?.comparison ? `${path}/comparison` : undefined}
        />
      )}
    </Page>
  );
}

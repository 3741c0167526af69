// server only
import type { JobRow } from '@/db/queries/jobs';
import type { SubmittalRow } from '@/db/queries/submittals';
import { env } from '@/lib/env';
import type { Actor } from './actor';
import { dayIn } from './day-in';

export interface Sending {
  job: JobRow;
  submittal: SubmittalRow;
  /** Number of the transmittal. */
  number: number;
  /** One sheet a line. */
  contents: string;
  /** What the reviewer is asked to do. */
  action: string;
  /** Whether the sealed file goes with the letter, or would if it were not too large. */
  attached: boolean;
  tooLarge: boolean;
  reviewer: string;
  token: string;
  expires: Date;
}

/** The letter that a submittal goes out with; the record stands behind its link. */
export function writeTransmittal(actor: Actor, sending: Sending): { subject: string; body: string } {
  const { job, submittal, number, contents, action, attached, tooLarge, reviewer, token, expires } = sending;
  const lines = [
    `${reviewer},`,
    '',
    `${actor.officeName} sends you submittal ${submittal.number} of ${job.number} ${job.title}, ${submittal.purpose}, ${submittal.pages} pages:`,
    '',
    contents,
    ...(submittal.remarks === '' ? [] : ['', submittal.remarks]),
    '',
    `What we ask of you: ${action}`,
    ...(attached ? ['', 'The sealed package is attached.'] : []),
    ...(tooLarge ? ['', 'The sealed package is too large to be attached; the link opens it.'] : []),
    '',
    'Read it, comment on its lines and record your decision here; no account is needed:',
    `${env().appUrl}/review/${token}`,
    '',
    `The link is good until ${dayIn(actor.zone, expires)}. What is said there is the record; this letter only points to it.`,
    '',
    `${actor.name}, ${actor.officeName}`,
  ];
  return {
    subject: `${job.number} ${job.title}: submittal ${submittal.number}, transmittal ${number}`.slice(0, 200),
    body: lines.join('\n'),
  };
}

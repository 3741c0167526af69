import type { Block } from './block';
import { plain } from './plain-text';

/** A reviewer's comment and all that was said under it, in order. */
export interface AnsweredComment {
  /** Number of the submittal it was made on, and the decision there, if one is recorded. */
  round: number;
  decision: string | null;
  number: number;
  /** "S-01 revision 0, line 2.1". */
  about: string;
  code: string;
  text: string;
  author: string;
  date: string;
  state: 'open' | 'answered' | 'accepted' | 'reopened';
  said: readonly {
    kind: 'answered' | 'accepted' | 'reopened';
    text: string;
    place: string;
    author: string;
    date: string;
  }[];
}

const states = {
  open: 'open',
  answered: 'answered',
  accepted: 'answer accepted',
  reopened: 're-opened',
} as const satisfies Record<AnsweredComment['state'], string>;

/** An itemised answer to every comment, round by round; nothing when there was no comment. */
export function composeResponses(comments: readonly AnsweredComment[]): Block[] {
  const rounds = [...new Set(comments.map((c) => c.round))];
  return rounds.flatMap((round): Block[] => {
    const own = comments.filter((c) => c.round === round);
    const decision = own[0]?.decision;
    const heading = `Answers to comments on submittal ${round}`;
    return [
      {
        kind: 'heading',
        id: `C${round}`,
        text: decision ? `${heading}, ${plain(decision)}` : heading,
      },
      ...own.flatMap(composeComment),
    ];
  });
}

function composeComment(c: AnsweredComment): Block[] {
  const id = `C${c.round}.${c.number}`;
  const code = c.code === '' ? '' : `, ${plain(c.code)}`;
  const asked = `**Comment ${c.number}**, ${c.about}${code} (${plain(c.author)}, ${c.date}; ${states[c.state]}): ${plain(c.text)}`;
  return [
    { kind: 'paragraph', id, text: asked },
    ...(c.said.length === 0
      ? [{ kind: 'paragraph' as const, id: `${id}.0`, text: 'Not answered yet.' }]
      : c.said.map((s, i) => ({
          kind: 'paragraph' as const,
          id: `${id}.${i + 1}`,
          text: `**${heads[s.kind]}** (${plain(s.author)}, ${s.date})${s.text === '' ? '' : `: ${plain(s.text)}`}${
            s.place === '' ? '' : ` Where: ${plain(s.place)}.`
          }`,
        }))),
  ];
}

const heads = {
  answered: 'Answer',
  accepted: 'Accepted',
  reopened: 'Asked again',
} as const satisfies Record<AnsweredComment['said'][number]['kind'], string>;

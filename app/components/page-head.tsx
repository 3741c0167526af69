import Link from 'next/link';
import { Fragment } from 'react';
import type { Actor } from '@/lib/services/actor';
import { leave } from '../sign-in/leave';

export interface PathPart {
  label: string;
  href?: string;
}

const places = [
  { label: 'Jobs', href: '/jobs' },
  { label: 'Office', href: '/office' },
];

/** Where one is, and the ways elsewhere. The last part of the path is the page itself. */
export function PageHead({ path, actor }: { path: PathPart[]; actor?: Pick<Actor, 'name' | 'initials'> }) {
  const here = path.at(-1);
  return (
    <>
      <a className="skip" href="#main">
        To the page
      </a>
      <header className="head">
        <Link className="word" href="/">
          Fairhand
        </Link>
        <nav className="path" aria-label="Where you are">
          {path.map((part) => (
            <Fragment key={part.label}>
              {part === path[0] ? null : <i aria-hidden="true">/</i>}
              {part === here || !part.href ? (
                <b aria-current={part === here ? 'page' : undefined}>{part.label}</b>
              ) : (
                <Link href={part.href}>{part.label}</Link>
              )}
            </Fragment>
          ))}
        </nav>
        {actor ? (
          <nav className="links" aria-label="Everywhere">
            {places.map((place) => (
              <Link
                key={place.href}
                href={place.href}
                aria-current={path[0]?.label === place.label ? 'true' : undefined}
              >
                {place.label}
              </Link>
            ))}
            <Link className="who" href="/account" aria-label={`${actor.name}, your account`}>
              <span className="full">{actor.name}</span>
              <span className="ini">{actor.initials}</span>
            </Link>
            <form action={leave}>
              <button type="submit">Sign out</button>
            </form>
          </nav>
        ) : null}
      </header>
    </>
  );
}

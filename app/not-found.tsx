import Link from 'next/link';
import { Page } from './components/page-layout';
import { currentActor } from './session';

export default async function NotFoundPage() {
  const actor = await currentActor();
  return (
    <Page
      path={[{ label: 'No such page' }]}
      actor={actor}
      margin={
        <>
          <div className="bigno red">404</div>
          <div className="under">no such page</div>
        </>
      }
      foot={[actor?.officeName ?? 'Fairhand']}
    >
      <div className="in">
        <h1>There is no such page.</h1>
        <p className="lead3">
          The address may be mistyped, or it belongs to another office. Numbers of jobs and sheets are never
          used twice, so nothing was taken from this place.
        </p>
        <div className="row">
          <Link className="btn p" href={actor ? '/jobs' : '/sign-in'}>
            {actor ? 'Jobs' : 'Sign in'}
          </Link>
        </div>
      </div>
    </Page>
  );
}

import Link from 'next/link';
import { Page } from './components/page-layout';
import { currentActor } from './session';

export default async function ForbiddenPage() {
  const actor = await currentActor();
  return (
    <Page
      path={[{ label: 'Not allowed' }]}
      actor={actor}
      margin={
        <>
          <div className="bigno red">403</div>
          <div className="under">not allowed</div>
        </>
      }
      foot={[actor?.officeName ?? 'Fairhand']}
    >
      <div className="in">
        <h1>Your roles in the office do not allow this.</h1>
        <p className="lead3">
          Nothing was changed.{' '}
          {actor ? `You act here as ${actor.roles.join(', ').replaceAll('-', ' ')}. ` : ''}
          An administrator of the office can give you another role.
        </p>
        <div className="row">
          <Link className="btn p" href="/jobs">
            Jobs
          </Link>
          <Link className="btn" href="/office">
            Office
          </Link>
        </div>
      </div>
    </Page>
  );
}

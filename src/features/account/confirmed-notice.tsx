import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { ButtonLink } from '../../components/button';
import { LoadingState } from '../../components/states';
import { Stamp } from '../../components/stamp';
import { sentenceForCode } from '../../lib/auth-calls';
import { meQuery } from '../../lib/queries/account';
import { safePath, withBack } from '../../lib/return-path';

/** Where the link in the mail leads: it has signed the person in, or says why not. */
export function ConfirmedNotice() {
  const [search] = useSearchParams();
  const back = safePath(search.get('back'));
  const error = search.get('error');
  const me = useQuery({ ...meQuery(), retry: false, enabled: error === null });
  if (error !== null) {
    return (
      <div className="grid gap-4">
        <p className="text-lg">
          {sentenceForCode(error) ?? 'This link does not confirm anything any more.'} Sign in, and we send another.
        </p>
        <div>
          <ButtonLink to={withBack('/sign-in', back)} kind="main">
            To the sign-in
          </ButtonLink>
        </div>
      </div>
    );
  }
  if (me.isPending) return <LoadingState what="your account" />;
  return (
    <div className="grid justify-items-start gap-5">
      <Stamp colour="clears" className="text-2xl">
        confirmed
      </Stamp>
      {me.isSuccess ? (
        <>
          <p className="text-lg">Your mail address is confirmed, and you are signed in.</p>
          <ButtonLink to={back} kind="main" replace>
            {back === '/' ? 'Begin' : 'Go on'}
          </ButtonLink>
        </>
      ) : (
        <>
          <p className="text-lg">Your mail address is confirmed.</p>
          <ButtonLink to={withBack('/sign-in', back)} kind="main">
            Sign in
          </ButtonLink>
        </>
      )}
    </div>
  );
}

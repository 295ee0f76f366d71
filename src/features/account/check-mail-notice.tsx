import { useState } from 'react';
import { Link, useLocation, useSearchParams } from 'react-router-dom';
import { Button } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { Stamp } from '../../components/stamp';
import { sendConfirmation } from '../../lib/auth-calls';
import { safePath, withBack } from '../../lib/return-path';
import { MailHint } from './mail-hint';

/** The address that the page before handed on; empty after a fresh visit. */
function useAddress(): string {
  const state: unknown = useLocation().state;
  return typeof state === 'object' && state !== null && 'to' in state && typeof state.to === 'string' ? state.to : '';
}

export function CheckMailNotice() {
  const to = useAddress();
  const back = safePath(useSearchParams()[0].get('back'));
  const [sent, setSent] = useState<'no' | 'under-way' | 'yes'>('no');
  const [fault, setFault] = useState<string | null>(null);
  const again = async (): Promise<void> => {
    setFault(null);
    setSent('under-way');
    const answer = await sendConfirmation(to, back);
    setSent(answer.ok ? 'yes' : 'no');
    if (!answer.ok) setFault(answer.sentence);
  };
  return (
    <div className="grid gap-4">
      <p className="text-lg">
        {to === '' ? 'We have sent a link to your mail address.' : 'We have sent a link to '}
        {to !== '' && <b className="break-all">{to}</b>}
        {to !== '' && '.'} Open it to confirm the address; it signs you in.
      </p>
      <MailHint to={to} />
      <FormFault text={fault} />
      <div className="flex flex-wrap items-center gap-4">
        {to !== '' && sent !== 'yes' && (
          <Button busy={sent === 'under-way'} onClick={() => void again()}>
            Send the link again
          </Button>
        )}
        <span role="status">{sent === 'yes' && <Stamp colour="clears">sent again</Stamp>}</span>
        <Link to={withBack('/sign-in', back)} className="link">
          To the sign-in
        </Link>
      </div>
    </div>
  );
}

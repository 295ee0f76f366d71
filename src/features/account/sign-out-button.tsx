import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { Button } from '../../components/button';
import { notify } from '../../components/toast';
import { signOut } from '../../lib/auth-calls';

export function SignOutButton() {
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const [isLeaving, setLeaving] = useState(false);
  const leave = async (): Promise<void> => {
    setLeaving(true);
    const answer = await signOut();
    if (!answer.ok) {
      setLeaving(false);
      notify({ text: answer.sentence, problem: true });
      return;
    }
    await navigate('/sign-in', { replace: true });
    queryClient.clear();
  };
  return (
    <Button busy={isLeaving} onClick={() => void leave()}>
      Sign out
    </Button>
  );
}

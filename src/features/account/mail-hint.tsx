import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { serverFactsQuery } from '../../lib/queries/account';

/** Where the mail is to be found: in local mode it never leaves this machine. */
export function MailHint({ to }: { readonly to: string }) {
  const facts = useQuery(serverFactsQuery());
  if (facts.data?.mailShelf === true) {
    return (
      <p>
        This server keeps its mails on a shelf instead of sending them:{' '}
        <Link to={to === '' ? '/mail' : `/mail?to=${encodeURIComponent(to)}`} className="link font-semibold">
          look on the mail shelf
        </Link>
        .
      </p>
    );
  }
  return <p>If nothing comes within some minutes, look among the unwanted mails.</p>;
}

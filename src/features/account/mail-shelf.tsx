import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { SearchField } from '../../components/search-field';
import { EmptyState, ErrorState, LoadingState } from '../../components/states';
import { When } from '../../components/when';
import { isProblem, tell } from '../../lib/api-problem';
import { shelvedMailQuery } from '../../lib/queries/account';

/** Mails of a local server, newest first. */
export function MailShelf() {
  const [search, setSearch] = useSearchParams();
  const to = search.get('to') ?? '';
  const mails = useQuery(shelvedMailQuery(to));
  return (
    <>
      <SearchField
        label="One address only"
        value={to}
        className="mb-5 max-w-md"
        onSearch={(text) => setSearch(text === '' ? {} : { to: text }, { replace: true })}
      />
      {mails.isPending && <LoadingState what="the mails" />}
      {mails.isError &&
        (isProblem(mails.error, 'thing/missing') ? (
          <EmptyState title="This server sends its mails by post" small>
            Look into your own mailbox.
          </EmptyState>
        ) : (
          <ErrorState {...tell(mails.error)} onRetry={() => void mails.refetch()} />
        ))}
      {mails.data?.length === 0 && (
        <EmptyState title="The shelf is empty" small>
          {to === '' ? 'Mails come here as soon as somebody signs up or is invited.' : `No mail went to ${to}.`}
        </EmptyState>
      )}
      <ul className="grid max-w-3xl gap-3">
        {mails.data?.map((mail) => (
          <li key={mail.id} className="cut p-4 sm:px-6">
            <div className="flex flex-wrap justify-between gap-x-4 border-b border-dashed border-line pr-4 pb-2 text-sm text-soft">
              <span className="min-w-0 break-all">to {mail.to}</span>
              <When iso={mail.sentAt} />
            </div>
            <h2 className="mt-2 font-bold">{mail.subject}</h2>
            <MailText text={mail.text} />
          </li>
        ))}
      </ul>
    </>
  );
}

/** Tokens make addresses long; what follows the first of it says nothing to a reader. */
const shorten = (address: string): string => (address.length > 72 ? `${address.slice(0, 64)}…` : address);

/** The text with its addresses as links; only ours lead on. */
function MailText({ text }: { readonly text: string }) {
  return (
    <div className="mt-1 break-words whitespace-pre-line">
      {text
        .trim()
        .split(/(https?:\/\/\S+)/)
        .map((piece, i) =>
          i % 2 === 1 ? (
            <a key={i} href={piece} className="link font-semibold break-all">
              {shorten(piece)}
            </a>
          ) : (
            piece
          ),
        )}
    </div>
  );
}

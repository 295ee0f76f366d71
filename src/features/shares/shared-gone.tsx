import { Wordmark } from '../../components/wordmark';

const WORDS = {
  revoked: {
    title: 'This link was revoked',
    text: 'Whoever made it has closed it, so it shows nothing any more. Ask the person who posted it for a new one.',
  },
  unknown: {
    title: 'There is nothing behind this link',
    text: 'The address may have lost its end while it was copied. Ask the person who sent it to you for the whole of it.',
  },
} as const;

/** A share link that opens nothing says so, and no more. */
export function SharedGone({ why }: { readonly why: keyof typeof WORDS }) {
  const { title, text } = WORDS[why];
  return (
    <div className="on-card min-h-dvh bg-ground">
      <main id="main" tabIndex={-1} className="mx-auto max-w-2xl px-4 py-10">
        <Wordmark className="text-3xl" />
        <div className="mt-6 border-2 border-dashed border-line p-6">
          <h1 className="text-2xl font-extrabold">{title}</h1>
          <p className="mt-2 text-soft">{text}</p>
        </div>
      </main>
    </div>
  );
}

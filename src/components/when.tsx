import { formatWhen, formatWhenFully } from '../lib/format';

/** A moment, short, with the whole of it for readers and on pointing. */
export const When = ({ iso }: { readonly iso: string }) => (
  <time dateTime={iso} title={formatWhenFully(iso)} className="figures">
    {formatWhen(iso, new Date())}
  </time>
);

// The cautions of the product: wherever a result is read, printed, shared or signed. The words are shared with the server.
import { Link } from 'react-router-dom';
import { CAUTION_BEFORE_WORK, CAUTION_SHORT, CAUTIONS } from '#shared/review';
import { PlateMark } from './pictograms';

/** One line, with the way to all of them. */
export const CautionLine = ({ linked = true }: { readonly linked?: boolean }) => (
  <p className="text-sm text-soft">
    {CAUTION_SHORT}{' '}
    {linked && (
      <Link to="/help/cautions" className="link whitespace-nowrap">
        All cautions
      </Link>
    )}
  </p>
);

/** All of them, as a plate. */
export function Cautions({ beforeWork = false }: { readonly beforeWork?: boolean }) {
  return (
    <aside aria-label="Cautions" className="border-y-2 border-strong py-3">
      <p className="flex items-center gap-2 font-bold">
        <PlateMark className="text-accent" />
        Pedals, brakes and steering can kill.
      </p>
      <ul className="mt-1 grid gap-1 text-sm">
        {CAUTIONS.map((caution) => (
          <li key={caution} className="border-t border-dashed border-line pt-1 first:border-0">
            {caution}
          </li>
        ))}
        {beforeWork && <li className="border-t border-dashed border-line pt-1">{CAUTION_BEFORE_WORK}</li>}
      </ul>
    </aside>
  );
}

// The desk: card stock, a head with the product's name and the person's tag over a steel scale, the caution at the foot.
import { Link, Outlet } from 'react-router-dom';
import { CautionLine } from '../components/cautions';
import { SteelScale } from '../components/steel-scale';
import { Wordmark } from '../components/wordmark';
import { AccountTag } from './account-tag';

export const PaperLayout = () => (
  <div className="on-card flex min-h-dvh flex-col bg-ground">
    <header className="no-print">
      <div className="mx-auto flex max-w-[72rem] items-center justify-between gap-4 px-4 py-3 sm:px-8">
        <Link to="/" aria-label="Gapwright, to your teams" className="flex-none py-1 text-2xl no-underline">
          <Wordmark />
        </Link>
        <AccountTag />
      </div>
      <SteelScale className="border-y border-steel-etch/40" />
    </header>
    <main id="main" tabIndex={-1} className="mx-auto w-full max-w-[72rem] grow px-4 pt-6 pb-14 sm:px-8 sm:pt-8">
      <Outlet />
    </main>
    <footer className="mx-auto w-full max-w-[72rem] px-4 pb-8 sm:px-8">
      <div className="border-t-2 border-strong pt-3">
        <CautionLine />
      </div>
    </footer>
  </div>
);

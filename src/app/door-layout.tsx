// In front of the product: what it is, scribed on dye, and beside it the form to come in.
import { Link, Outlet } from 'react-router-dom';
import { SteelScale } from '../components/steel-scale';
import { Wordmark } from '../components/wordmark';
import { ZoneDrawing } from '../components/zone-drawing';

export const DoorLayout = () => (
  <div className="on-card grid min-h-dvh bg-ground lg:grid-cols-[minmax(0,1.15fr)_minmax(0,1fr)]">
    <section
      aria-label="What Gapwright is"
      className="on-dye relative flex min-h-56 flex-col overflow-hidden bg-ground lg:min-h-dvh"
    >
      <ZoneDrawing className="absolute inset-0 h-full w-full opacity-45 lg:opacity-100" />
      <div className="relative grid gap-2 bg-gradient-to-b from-dye-deep/95 via-dye-deep/60 to-transparent px-5 pt-5 pb-10 sm:px-10 sm:pt-9">
        <Link to="/sign-in" aria-label="Gapwright" className="w-fit text-3xl no-underline">
          <Wordmark />
        </Link>
        <p className="max-w-[34ch] text-xl leading-snug font-light sm:text-2xl">
          Arrange pedal box, column and cylinders around an old car’s firewall. <b>Find what hits before you cut.</b>
        </p>
      </div>
    </section>
    <div className="flex flex-col">
      <SteelScale className="lg:hidden" />
      <main
        id="main"
        tabIndex={-1}
        className="mx-auto grid w-full max-w-md grow content-start px-5 py-8 lg:content-center lg:py-12"
      >
        <Outlet />
      </main>
      <p className="mx-auto w-full max-w-md px-5 pb-6 text-sm text-soft">
        The check is geometric and only as good as the measurements.{' '}
        <Link to="/help/cautions" className="link">
          Read the cautions
        </Link>
      </p>
    </div>
  </div>
);

// In front of the product: what it is, scribed on dye, and beside it the form to come in.
import { Link, Outlet } from 'react-router-dom';
import { Hole } from '../components/hole';
import { SteelScale } from '../components/steel-scale';
import { Wordmark } from '../components/wordmark';
import { ZoneDrawing } from '../components/zone-drawing';

export const DoorLayout = () => (
  <div className="on-card grid min-h-dvh bg-ground lg:grid-cols-[minmax(0,1.15fr)_minmax(0,1fr)]">
    <section
      aria-label="What Gapwright is"
      className="on-dye relative flex min-h-56 flex-col overflow-hidden bg-ground lg:min-h-dvh"
    >
      <ZoneDrawing className="absolute inset-0 h-full w-full opacity-40 lg:opacity-100" />
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
        className="mx-auto grid w-full max-w-lg grow content-start py-6 sm:px-5 sm:py-10 lg:content-center"
      >
        <div className="cut px-5 [--cut:30px] max-sm:[--paper-edge:transparent] max-sm:[--paper:transparent] sm:px-9 sm:pt-6 sm:pb-9">
          <Hole ring className="mb-5 !hidden !h-3.5 !w-3.5 sm:!inline-block" />
          <Outlet />
        </div>
      </main>
      <footer className="mx-auto w-full max-w-lg px-5 pb-6 text-sm text-soft">
        The check is geometric and only as good as the measurements.{' '}
        <Link to="/help/cautions" className="link">
          Read the cautions
        </Link>
      </footer>
    </div>
  </div>
);

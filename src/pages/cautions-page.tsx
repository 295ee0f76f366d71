import { Cautions } from '../components/cautions';
import { PageHead, Section } from '../components/page-head';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Cautions');
  return (
    <>
      <PageHead title="Cautions" lead="They hold for every result that you read, print, send, share or sign." />
      <div className="max-w-2xl">
        <Cautions beforeWork />
        <Section title="What a check proves, and what not" className="mt-8">
          <div className="grid gap-3">
            <p>
              It proves gaps between the shapes you placed, over the strokes you gave them, with the tolerances you set.
              A part that was left out is not checked, a wrong measurement is checked as it was typed, and a bracket
              that bends is checked as if it did not.
            </p>
            <p>
              It does not prove that a pedal box is strong enough, that brakes work, that a seal lives beside an
              exhaust, or that the car may drive on the road.
            </p>
          </div>
        </Section>
      </div>
    </>
  );
}

import { ButtonLink } from '../components/button';
import { PageHead } from '../components/page-head';
import { TemplateDrawing } from '../components/template-drawing';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Nothing here');
  return (
    <>
      <PageHead title="There is nothing at this address" lead="It may have been moved, mistyped, or taken away." />
      <TemplateDrawing className="mb-6 w-64 text-soft" />
      <ButtonLink to="/" kind="main">
        To your teams
      </ButtonLink>
    </>
  );
}

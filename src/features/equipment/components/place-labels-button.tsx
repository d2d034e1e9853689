import { paths } from '#contract/paths';
import type { PlaceLabelQuery } from '#contract/equipment';
import { LinkButton } from '../../../components/ui/link-button';
import { withQuery } from '../../../lib/api-client';

/** Opens the labels of places as a PDF: of a cart's shelves, of the holders of a kind, or of one holder. */
export function PlaceLabelsButton({ of, children }: { of: Partial<PlaceLabelQuery>; children: string }) {
  return (
    <LinkButton
      to={withQuery(paths.placeLabels, of)}
      isFile
      kind="quiet"
      size="small"
      icon="print"
      className="justify-self-start"
    >
      {children}
    </LinkButton>
  );
}

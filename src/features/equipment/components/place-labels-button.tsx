import { paths } from '#contract/paths';
import type { PlaceLabelQuery } from '#contract/equipment';
import { FileLink } from '../../../components/ui/file-link';
import { withQuery } from '../../../lib/api-client';

/** Opens the labels of places as a PDF: of a cart's shelves, of the holders of a kind, or of one holder. */
export function PlaceLabelsButton({ of, children }: { of: Partial<PlaceLabelQuery>; children: string }) {
  return (
    <FileLink
      to={withQuery(paths.placeLabels, of)}
      how="open"
      kind="quiet"
      size="small"
      icon="print"
      className="justify-self-start"
    >
      {children}
    </FileLink>
  );
}

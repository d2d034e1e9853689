import { textTwin } from '#domain/load/text-twin';
import type { Finding } from '#domain/load/finding';
import type { LoadView } from '#domain/load/model';
import { memo } from 'react';

/** The map for those who do not see it: shelf, holder, slot, item, facing, finding. */
export const CartInWords = memo(function CartInWords({
  view,
  findings,
}: {
  view: LoadView;
  findings: readonly Finding[];
}) {
  return (
    <section aria-label={`${view.cart.name} in words`} className="sr-only">
      {textTwin(view, findings).map((part) => (
        <div key={part.heading}>
          <h3>{part.heading}</h3>
          <ul>
            {part.lines.map((line, index) => (
              <li key={`${index} ${line}`}>{line}</li>
            ))}
          </ul>
        </div>
      ))}
    </section>
  );
});

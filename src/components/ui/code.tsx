/** A code as printed: its zero is no O, and it is never broken over two lines. */
export function Code({ children, className = '' }: { children: string; className?: string }) {
  return <span className={`code ${className}`}>{children}</span>;
}

/** Our own codes and load numbers as they stand in sentences: P-20431784-52, 2-26076-03. */
const codeInText = /(\b[A-Z0-9]{1,6}-\d{5,8}-\d{2,4}\b)/;

/** A sentence whose codes stay whole: a line may break before or after one, never at its hyphens. */
export function TextWithCodes({ children }: { children: string }) {
  return children.split(codeInText).map((part, index) =>
    index % 2 === 1 ? (
      <span key={index} className="whitespace-nowrap">
        {part}
      </span>
    ) : (
      part
    ),
  );
}

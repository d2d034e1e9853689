/** A code as printed: its zero is no O, and it is never broken over two lines. */
export function Code({ children, className = '' }: { children: string; className?: string }) {
  return <span className={`code ${className}`}>{children}</span>;
}

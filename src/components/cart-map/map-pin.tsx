import type { Severity } from '#domain/load/finding';

/** The same outline as in the list and in the gate: shield holds, square asks for another look, circle is a note. */
export function MapPin({
  x,
  y,
  letter,
  severity,
  isOpen = false,
}: {
  x: number;
  y: number;
  letter: string;
  severity: Severity;
  isOpen?: boolean;
}) {
  const text = (dy: number, className: string) => (
    <text y={dy} textAnchor="middle" fontSize={letter.length > 1 ? 12 : 14} fontWeight={720} className={className}>
      {letter}
    </text>
  );
  return (
    <g transform={`translate(${x} ${y})`} className="pointer-events-none">
      {isOpen && <circle cy={-13} r={19} fill="none" strokeWidth="2" className="stroke-ink-1" />}
      {severity === 'stop' && (
        <>
          <path d="M-12-26h24v17l-12 9-12-9z" strokeWidth="1.5" className="fill-madder-3 stroke-paper-0" />
          {text(-10.5, 'fill-paper-0')}
        </>
      )}
      {severity === 'accept' && (
        <>
          <rect x={-12} y={-24} width={24} height={24} strokeWidth="2" className="fill-straw-1 stroke-straw-3" />
          {text(-7, 'fill-ink-1')}
        </>
      )}
      {severity === 'advice' && (
        <>
          <circle cy={-12} r={12} strokeWidth="1.5" className="fill-paper-0 stroke-ink-2" />
          {text(-7, 'fill-ink-1')}
        </>
      )}
    </g>
  );
}

const pitch = 104;
const across = 150;
const rise = 74;
const floor = 742;
const heights = [470, 420, 450, 400, 470, 430, 455, 410, 465, 440, 425, 460, 405, 450] as const;
const width = heights.length * pitch + across;
const freeSlot = 5;

/** Closed shapes, tip up: forceps, scissors, needle holder, suction tip. */
const instruments = [
  'M0 60C-9 10-11-60-9-110L-4-178l4 12 4-12 5 68C11-60 9 10 0 60zM0 36C5-10 6-60 3-128L0-140l-3 12C-6-60-5-10 0 36z',
  'M-3-30L-12-178-2-172 2-40 6-172 16-178 7-30 24 40a17 17 0 1 1-12 4L2-14-8 44a17 17 0 1 1-12-4zM-18 52a8 8 0 1 0 3 15a8 8 0 1 0-3-15zM22 52a8 8 0 1 0 3 15a8 8 0 1 0-3-15z',
  'M-5-178h10l3 60-5 14 6 18-4 110a15 15 0 1 1-10 0l-4-110 6-18-5-14zM0 40a7 7 0 1 0 .1 0z',
  'M-4 70v-60l-6-14h4C-8-80-8-130 14-176l8 4C2-130 0-80 4-4h4l-4 14v60z',
] as const;

function Leaf({ at, height }: { at: number; height: number }) {
  const x = 6 + at * pitch;
  if (at === freeSlot) {
    return (
      <g transform={`matrix(1 ${-rise / across} 0 1 ${x} ${floor})`}>
        <path
          d={`M0 0V${-height}H${across}V0z`}
          fill="none"
          className="stroke-film-4"
          strokeWidth="2"
          strokeDasharray="9 7"
        />
      </g>
    );
  }
  return (
    <>
      <g transform={`matrix(1 ${-rise / across} 0 1 ${x} ${floor})`}>
        <path d={`M0 0V${-height}H${across}V0z`} fill="url(#leaf-film)" className="stroke-film-4" strokeWidth="1.6" />
        <path
          d={`M14 -16V${-height + 64}L${across / 2} ${-height + 36}L${across - 14} ${-height + 64}V-16z`}
          fill="none"
          className="stroke-film-4"
          strokeWidth="6"
          strokeDasharray="1.3 4"
          opacity=".8"
        />
        <path
          transform={`translate(${across * 0.42} ${-height * 0.36}) scale(1.05)`}
          d={instruments[at % instruments.length]}
          className="fill-ink-2"
          fillOpacity=".62"
          fillRule="evenodd"
        />
      </g>
      <path d={`M${x} ${floor}v${-height}l-13 7v${height}z`} className="fill-leaf-paper" />
      <path
        d={`M${x} ${floor}v${-height}l-13 7v${height}z`}
        fill="url(#leaf-fibre)"
        className="stroke-paper-edge"
        strokeWidth="1.4"
      />
    </>
  );
}

/** A holder of pouches seen from very near, the sixth slot still free. Decoration only; scaled by its height. */
export function LeavesArt({ className = '' }: { className?: string }) {
  return (
    <svg className={className} viewBox={`0 0 ${width} 800`} preserveAspectRatio="xMinYMax slice" aria-hidden="true">
      <defs>
        <linearGradient id="leaf-film" x1="0" y1="0" x2="1" y2=".25">
          <stop offset="0" stopColor="#A9D3CF" stopOpacity=".92" />
          <stop offset=".36" stopColor="#CFE7E4" stopOpacity=".86" />
          <stop offset=".37" stopColor="#F2FAF8" stopOpacity=".92" />
          <stop offset=".5" stopColor="#D6EAE7" stopOpacity=".84" />
          <stop offset="1" stopColor="#8FC4C2" stopOpacity=".9" />
        </linearGradient>
        <pattern id="leaf-fibre" width="60" height="50" patternUnits="userSpaceOnUse">
          <path
            d="M4 10q12-8 26 0M34 30q12 6 22-3M10 42l16-5M42 8l11 5"
            stroke="#9A7F47"
            strokeOpacity=".45"
            strokeWidth="1.2"
            fill="none"
          />
        </pattern>
      </defs>
      {heights.map((height, at) => (
        <Leaf key={at} at={at} height={height} />
      ))}
      <path d={`M-10 ${floor + 6}H${width}`} className="stroke-ink-1" strokeWidth="3" />
      <path d={`M-10 ${floor + 18}H${width}`} className="stroke-ink-1" strokeWidth="1.4" />
      {heights.map((_, at) => (
        <text
          key={at}
          x={6 + at * pitch + 28}
          y={floor + 42}
          fontSize="17"
          fontWeight="560"
          className={at === freeSlot ? 'fill-film-5' : 'fill-ink-2'}
        >
          {at + 1}
        </text>
      ))}
    </svg>
  );
}

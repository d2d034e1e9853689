/** A leaf seen on edge: paper half, film half, sealed at the top. */
export function Mark({ size = 34 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 34 34" aria-hidden="true" className="flex-none">
      <path d="M6 4h11v26H6z" className="fill-leaf-paper" />
      <path d="M8 11l5 2M10 20l5-3M7.5 25l4 1M12 7l3 1" fill="none" stroke="#fff" strokeOpacity=".7" strokeWidth="1" />
      <path d="M17 4h11v26H17z" className="fill-film-3" />
      <path d="M24 4h4L17 22v-7z" fill="#fff" fillOpacity=".28" />
      <path d="M6 4h22v4.5H6z" className="fill-film-5" />
      <path
        d="M8.5 4v4.5M11.5 4v4.5M14.5 4v4.5M17.5 4v4.5M20.5 4v4.5M23.5 4v4.5"
        fill="none"
        className="stroke-film-2"
        strokeWidth=".9"
      />
    </svg>
  );
}

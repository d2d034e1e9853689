import { useEffect, useState, type RefCallback } from 'react';

export type Size = { readonly width: number; readonly height: number };

/** The size an element has on the screen, px: drawings are redrawn for it, never stretched. null until it is known. */
export function useSize(): [RefCallback<HTMLElement>, Size | null] {
  const [element, setElement] = useState<HTMLElement | null>(null);
  const [size, setSize] = useState<Size | null>(null);
  useEffect(() => {
    if (element === null) return;
    const observer = new ResizeObserver(([entry]) => {
      if (!entry) return;
      const { width, height } = entry.contentRect;
      setSize((known) => (known?.width === width && known.height === height ? known : { width, height }));
    });
    observer.observe(element);
    return () => {
      observer.disconnect();
    };
  }, [element]);
  return [setElement, size];
}

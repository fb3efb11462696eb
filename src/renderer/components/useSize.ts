/** The size of an element in whole pixels, as it changes. */

import { useEffect, useState } from 'preact/hooks';
import type { Size } from '../tracks/frame';

/** Null before the size is known. */
export function useSize(element: { current: HTMLElement | null }): Size | null {
  const [size, setSize] = useState<Size | null>(null);
  useEffect(() => {
    const observer = new ResizeObserver(([entry]) => {
      const { width, height } = entry.contentRect;
      setSize({ width: Math.floor(width), height: Math.floor(height) });
    });
    observer.observe(element.current as HTMLElement);
    return () => observer.disconnect();
  }, []);
  return size && size.width > 0 && size.height > 0 ? size : null;
}

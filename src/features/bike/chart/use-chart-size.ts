import { useLayoutEffect, useRef, useState } from "react";
import type { ChartSize } from "./chart-frame.ts";

/** The width of the element that carries `ref`, and the reader's text size, as they change. */
export function useChartSize<E extends HTMLElement>() {
  const ref = useRef<E>(null);
  const [size, setSize] = useState<ChartSize | null>(null);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const measure = () => {
      const remPx = Number.parseFloat(getComputedStyle(document.documentElement).fontSize);
      const width = element.clientWidth;
      setSize((before) =>
        before?.width === width && before.remPx === remPx ? before : { width, remPx },
      );
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return { ref, size };
}

import { useEffect, useRef, useState, type RefObject } from 'react';

/** Width of an element in px, kept current; what is given until it is known. */
export function useWidth(initial: number): [RefObject<HTMLDivElement | null>, number] {
  const box = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(initial);
  useEffect(() => {
    const element = box.current;
    if (element === null) {
      return;
    }
    const measure = (): void => {
      const found = Math.round(element.getBoundingClientRect().width);
      if (found > 0) {
        setWidth(found);
      }
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [box, width];
}

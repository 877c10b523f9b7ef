'use client';

import { useEffect, useRef, useState } from 'react';

/**
 * Whether the content is wider than its box. Only then may the box scroll: a box that can scroll would catch the table's sticky head
 * even where there is nothing to scroll.
 */
export function useOverflow<Box extends HTMLElement>() {
  const box = useRef<Box>(null);
  const [overflows, setOverflows] = useState(false);
  useEffect(() => {
    const element = box.current;
    const content = element?.firstElementChild;
    if (!element || !(content instanceof HTMLElement)) return;
    const measure = () => setOverflows(content.scrollWidth > element.clientWidth + 1);
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    observer.observe(content);
    return () => observer.disconnect();
  }, []);
  return { box, overflows };
}

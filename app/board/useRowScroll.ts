import { useEffect } from 'react';
import { useHold } from '../live/EventContext';

/**
 * Scrolls a list in step with the other: both share the first row in sight. Only the list that the reader touched last leads,
 * so that the shorter one cannot pull the longer one back.
 */
export function useRowScroll(element: HTMLElement | null, name: 'table' | 'strip', rowPx: number): void {
  const { view } = useHold();
  useEffect(() => {
    if (!element) return;
    const lead = (): void => view.setState({ leader: name });
    const follow = (firstRow: number): void => {
      const target = firstRow * rowPx;
      if (Math.abs(element.scrollTop - target) > 1) element.scrollTop = target;
    };
    const scrolled = (): void => {
      if (view.getState().leader === name) view.setState({ firstRow: element.scrollTop / rowPx });
    };
    const touches = ['wheel', 'pointerdown', 'touchstart', 'keydown', 'focusin'] as const;
    for (const touch of touches) element.addEventListener(touch, lead, { passive: true });
    element.addEventListener('scroll', scrolled, { passive: true });
    const stop = view.subscribe((now, before) => {
      if (now.firstRow !== before.firstRow && now.leader !== name) follow(now.firstRow);
    });
    return () => {
      for (const touch of touches) element.removeEventListener(touch, lead);
      element.removeEventListener('scroll', scrolled);
      stop();
    };
  }, [element, name, rowPx, view]);
}

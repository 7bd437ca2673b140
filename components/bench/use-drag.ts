"use client";

import { useRef, type PointerEvent } from "react";

/** Pointer handlers that tell where along an element's length a press and a drag stand, 0 to 1. Each drag has a name of its own. */
export function useDrag(along: () => DOMRect | undefined, onDrag: (share: number, strand: string) => void, onEnd?: () => void) {
  const drags = useRef(0);
  const tell = (event: PointerEvent) => {
    const box = along();
    if (box && box.width > 0) onDrag(Math.min(Math.max((event.clientX - box.left) / box.width, 0), 1), `drag ${drags.current}`);
  };
  return {
    onPointerDown: (event: PointerEvent) => {
      if (event.button !== 0) return;
      drags.current += 1;
      event.currentTarget.setPointerCapture(event.pointerId);
      tell(event);
    },
    onPointerMove: (event: PointerEvent) => {
      if (event.currentTarget.hasPointerCapture(event.pointerId)) tell(event);
    },
    onPointerUp: () => onEnd?.(),
  };
}

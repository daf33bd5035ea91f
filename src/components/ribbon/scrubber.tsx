import { useLayoutEffect, useRef, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react';
import type { Cursor } from './cursor.ts';
import type { Layout } from './layout.ts';

interface ScrubberProps {
  layout: Layout;
  steps: number;
  cursor: Cursor;
  label: string;
  /** What a screen reader says of a step. */
  sentence: (index: number) => string;
  describedBy: string;
  /** The key that shows the table. */
  onTable: () => void;
  children: ReactNode;
}

const stepMinutes = 5;
/** Moves of the cursor by key, in steps. */
const keyMoves: Record<string, number> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1, PageDown: 6, PageUp: -6 };

/**
 * The drawing as a slider over time: pointer, touch and keys move one cursor. A move writes one transform and what the slider
 * says of itself; nothing is rendered anew. On the rail a finger drags; elsewhere it taps, and the page still scrolls.
 */
export function Scrubber({ layout, steps, cursor, label, sentence, describedBy, onTable, children }: ScrubberProps) {
  const slider = useRef<SVGSVGElement>(null);
  const moving = useRef<SVGGElement>(null);
  const last = steps - 1;

  useLayoutEffect(() => {
    const show = () => {
      const index = Math.min(cursor.read(), last);
      moving.current?.setAttribute('transform', layout.cursor(index));
      slider.current?.setAttribute('aria-valuenow', String(index * stepMinutes));
      slider.current?.setAttribute('aria-valuetext', sentence(index));
    };
    show();
    return cursor.subscribe(show);
  }, [cursor, layout, last, sentence]);

  const follow = (event: PointerEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    cursor.move(layout.indexAt(((event.clientX - box.left) / box.width) * layout.width, ((event.clientY - box.top) / box.height) * layout.height));
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.key.toLowerCase() === 't') return onTable();
    const index = Math.min(cursor.read(), last);
    const next = event.key === 'Home' ? 0 : event.key === 'End' ? last : event.key in keyMoves ? index + keyMoves[event.key]! : null;
    if (next === null) return;
    event.preventDefault();
    cursor.move(Math.max(0, Math.min(last, next)));
  };

  return (
    <svg
      ref={slider}
      viewBox={`0 0 ${layout.width} ${layout.height}`}
      height={layout.height}
      className="block w-full cursor-ew-resize touch-pan-y select-none"
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-orientation={layout.upright ? 'vertical' : 'horizontal'}
      aria-valuemin={0}
      aria-valuemax={last * stepMinutes}
      aria-valuenow={0}
      aria-describedby={describedBy}
      aria-keyshortcuts="T"
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        if (event.pointerType === 'mouse' && event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        follow(event);
      }}
      onPointerMove={(event) => event.buttons > 0 && follow(event)}
    >
      {children}
      <g ref={moving} className="pointer-events-none">
        <path d={layout.cursorPath} className="ribbon-cursor" />
        <circle {...layout.cursorSun} r={11} className="ribbon-sun" />
      </g>
      <rect {...layout.rail} fill="transparent" className="touch-none" />
    </svg>
  );
}

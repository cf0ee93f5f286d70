'use client';

import { useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { railsBox, tubeEdge } from '@/lib/rails/rails-geometry';
import { setField } from '@/lib/sequence/draft-edits';
import type { StepOf } from '@/lib/sequence/step';
import { useEditor } from './editor-context';

interface TargetGripProps {
  trim: StepOf<'trim'>;
  /** Ends of the volt scale that the rails show. */
  scale: { scaleMinVolts: number; scaleMaxVolts: number };
}

const finest = 0.01;
const coarse = 0.1;
const ofWidth = (x: number) => `${(x / railsBox.width) * 100}%`;
const place = railsBox.bottomY - railsBox.topY;

/** The trim's target on the trip rail, with a blue grip: dragged, or moved by arrow keys in steps of 10 mV. */
export function TargetGrip({ trim, scale }: TargetGripProps) {
  const { edit, endGroup, locked } = useEditor();
  const grip = useRef<HTMLDivElement>(null);
  const { scaleMinVolts, scaleMaxVolts } = scale;
  const span = scaleMaxVolts - scaleMinVolts;
  const share = Math.min(1, Math.max(0, (scaleMaxVolts - trim.targetVolts) / span));
  const top = ((railsBox.topY + share * place) / railsBox.height) * 100;
  const [jawEnd, edge] = [railsBox.tripX - tubeEdge - 5 - railsBox.jawLength, railsBox.tripX - tubeEdge - 5];

  function set(volts: number): void {
    const value = Math.round(Math.min(scaleMaxVolts, Math.max(scaleMinVolts, volts)) / finest) / Math.round(1 / finest);
    edit((draft) => setField(draft, { stepId: trim.id, field: 'targetVolts', value }), `grip/${trim.id}`);
  }

  function onKeyDown(event: KeyboardEvent): void {
    const by = {
      ArrowUp: finest,
      ArrowRight: finest,
      ArrowDown: -finest,
      ArrowLeft: -finest,
      PageUp: coarse,
      PageDown: -coarse,
    }[event.key];
    if (by === undefined || event.altKey) return;
    event.preventDefault();
    set(trim.targetVolts + by);
  }

  function onPointerMove({ clientY, pointerId }: PointerEvent): void {
    const box = grip.current?.parentElement?.getBoundingClientRect();
    if (!box || !grip.current?.hasPointerCapture(pointerId)) return;
    const y = ((clientY - box.top) / box.height) * railsBox.height;
    set(scaleMaxVolts - ((y - railsBox.topY) / place) * span);
  }

  if (locked) return null;
  return (
    <div
      ref={grip}
      role="slider"
      tabIndex={0}
      aria-label="Trim target"
      aria-orientation="vertical"
      aria-valuemin={scaleMinVolts}
      aria-valuemax={scaleMaxVolts}
      aria-valuenow={trim.targetVolts}
      aria-valuetext={`${trim.targetVolts.toFixed(2)} V`}
      onKeyDown={onKeyDown}
      onBlur={endGroup}
      onPointerDown={(event) => event.currentTarget.setPointerCapture(event.pointerId)}
      onPointerMove={onPointerMove}
      onPointerUp={endGroup}
      style={{ top: `${top}%`, left: ofWidth(jawEnd), width: ofWidth(edge - jawEnd) }}
      className="absolute flex min-h-[30px] -translate-y-1/2 cursor-ns-resize touch-none items-center max-sm:min-h-[46px]"
    >
      <span aria-hidden="true" className="absolute inset-x-0 h-[3px] bg-accent" />
      <span
        aria-hidden="true"
        className="relative size-[18px] -translate-x-1/2 rounded-full border-[3px] border-accent bg-sheet"
      />
    </div>
  );
}

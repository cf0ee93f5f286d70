'use client';

import {
  closestCenter,
  DndContext,
  KeyboardSensor,
  PointerSensor,
  useSensor,
  useSensors,
  type Announcements,
  type UniqueIdentifier,
} from '@dnd-kit/core';
import { SortableContext, sortableKeyboardCoordinates, verticalListSortingStrategy } from '@dnd-kit/sortable';
import { stepWord } from '@/lib/sequence/value-words';
import type { LostAtStep } from '../dry-run/lost-at';
import { useEditor } from './editor-context';
import type { StepCommands } from './step-commands';
import { StepRow } from './step-row';

interface StepListProps {
  commands: StepCommands;
  /** What each step takes on the typical board, by id. */
  seconds: ReadonlyMap<string, number>;
  lostAt: ReadonlyMap<string, LostAtStep> | null;
}

/** The steps in order, moved by drag, or by keyboard at their grip: space lifts, arrows move, space drops. */
export function StepList({ commands, seconds, lostAt }: StepListProps) {
  const { draft } = useEditor();
  const { steps } = draft.sequence;
  const sensors = useSensors(
    useSensor(PointerSensor, { activationConstraint: { distance: 4 } }),
    useSensor(KeyboardSensor, { coordinateGetter: sortableKeyboardCoordinates }),
  );
  const placeOf = (id: UniqueIdentifier) => steps.findIndex((step) => step.id === id);
  const named = (id: UniqueIdentifier) => {
    const place = placeOf(id);
    return place < 0 ? 'The step' : `Step ${place + 1}, ${stepWord(steps[place]!)},`;
  };
  const announcements: Announcements = {
    onDragStart: ({ active }) => `${named(active.id)} is lifted.`,
    onDragOver: ({ active, over }) => (over ? `${named(active.id)} would be step ${placeOf(over.id) + 1}.` : undefined),
    onDragEnd: ({ active, over }) => (over ? `${named(active.id)} is now step ${placeOf(over.id) + 1}.` : undefined),
    onDragCancel: ({ active }) => `${named(active.id)} stays where it was.`,
  };
  return (
    <DndContext
      id="steps"
      sensors={sensors}
      collisionDetection={closestCenter}
      accessibility={{
        announcements,
        screenReaderInstructions: {
          draggable: 'Press space to lift the step, the arrow keys to move it, space to drop it, Escape to leave it.',
        },
      }}
      onDragEnd={({ active, over }) => over && commands.moveTo(String(active.id), placeOf(over.id))}
    >
      <SortableContext items={steps.map(({ id }) => id)} strategy={verticalListSortingStrategy}>
        <ol aria-label="Steps">
          {steps.map((step, i) => (
            <StepRow
              key={step.id}
              step={step}
              number={i + 1}
              seconds={seconds.get(step.id) ?? null}
              lost={lostAt?.get(step.id) ?? null}
              acts={commands.actsOf(step.id)}
            />
          ))}
        </ol>
      </SortableContext>
    </DndContext>
  );
}

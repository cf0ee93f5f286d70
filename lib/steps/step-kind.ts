import type { z } from 'zod';
import type { BoardType } from '../contracts/board-type';
import type { Act, StepContext, StepMachine } from '../run/machine';
import type { Measurement } from '../run/types';
import type { SequenceFinding } from '../sequence/finding';
import type { StationKind } from '../sequence/station-kind';
import type { DecisionRule, Step, StepGroup } from '../sequence/step';
import type { AnyStep } from './step-common';

/** What a rule may look at beside its own step. */
export interface RuleContext {
  boardType: BoardType;
  station: StationKind;
  decisionRule: DecisionRule;
  /** The enabled steps, in order, and the place of this one among them. */
  steps: readonly Step[];
  index: number;
  /** Those that are not enabled too. */
  allSteps: readonly Step[];
}

/** A blank of a step's sentence. `field` is a path into the step; the value shown is the stored one times `scale`. */
export interface SentenceField {
  field: string;
  /** Read out, and shown in comparisons: "Current limit". */
  label: string;
  input: 'number' | 'whole-number' | 'text' | 'choice' | 'step' | 'picture' | 'switch';
  unit?: string;
  /** 1000 where volts are stored and millivolts shown. */
  scale?: number;
  decimals?: number;
  /** Colour of the base line. */
  tone?: 'trip' | 'release';
  options?: readonly { value: string | number; label: string }[];
  /** The words of an empty number: "no limit". Only with it may the field be null. */
  whenNull?: string;
}
export type SentencePart = string | SentenceField;

type WithoutTime<E> = E extends { atMs: number } ? Omit<E, 'atMs'> : never;

/** What a person does while the step waits for one, and after how long. */
export interface TypicalAct {
  act: WithoutTime<Act>;
  afterMs: number;
}

/** Equipment a station needs for a step. */
export type Equipment = 'fixture-controller' | 'wiper-probe';

export type Required = Pick<Measurement, 'quantity' | 'phase'>;

/**
 * One kind of step: everything that the editor, the rules, the prediction and the station need of it. Each kind is one folder of
 * lib/steps; step-kinds.ts lists them.
 */
// eslint-disable-next-line @typescript-eslint/no-explicit-any -- the state of a machine is its own affair.
export interface StepKindDefinition<S extends AnyStep = Step, M = any> {
  kind: S['kind'];
  /** What it is called where the engineer gave no name: "Find points". */
  word: string;
  /** One line of the list from which a step is added. */
  purpose: string;
  group: StepGroup;
  /** The points may have moved: nothing verified before it counts any more. */
  movesPoints?: true;
  schema: z.ZodType<S>;
  /** A new one with values that suit the board type. */
  fresh(boardType: BoardType): Omit<S, 'id' | 'name' | 'enabled'>;
  rules(step: S, context: RuleContext): SequenceFinding[];
  needs(step: S): Equipment[];
  /** What must have been measured, and passed, before a board may pass. */
  required(step: S): Required[];
  machine: StepMachine<S, M>;
  /** Prediction plays the machine on a typical board; this is the person beside it. Null: nobody has to act now. */
  typicalAct(machine: M, step: S, context: StepContext): TypicalAct | null;
  sentence(step: S): SentencePart[];
}
